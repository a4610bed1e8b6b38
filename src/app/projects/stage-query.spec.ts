import { stageQuery } from './stage-query.ts';

describe('the query of the stages table', () => {
  it('takes what the address says', () => {
    expect(
      stageQuery({
        search: 'relay',
        state: 'in-check',
        sort: 'margin',
        direction: 'desc',
        page: '2',
      }),
    ).toEqual({
      search: 'relay',
      state: 'in-check',
      sort: 'margin',
      direction: 'desc',
      page: 2,
    });
  });

  it('leaves out what nobody can mean', () => {
    expect(
      stageQuery({ state: 'lost', verdict: 'good', sort: 'colour', page: '-3', search: '' }),
    ).toEqual({});
  });
});
