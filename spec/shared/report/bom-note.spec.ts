import { describe, expect, it } from 'vitest';
import { BomNote } from '../../../shared/report/bom-note.ts';
import { buildBomNote } from '../../../shared/report/bom-note-build.ts';
import type { NoteSource } from '../../../shared/report/bom-note-source.ts';
import {
  dataText,
  occasionText,
  shortHash,
  signedText,
  stagesText,
  statusText,
} from '../../../shared/report/bom-note-text.ts';
import { ISSUE, PREVIEW, PROJECT, Q1, Q12, Q12_IN_CHECK, Q2, source } from './bom-note-fixture.ts';

const cautions = (...sources: NoteSource[]) =>
  buildBomNote(PROJECT, sources, PREVIEW).cautions.map(({ text }) => text);

function withPart(given: NoteSource, changes: Partial<NoteSource['parts'][number]>): NoteSource {
  const [transistor, ...others] = given.parts;
  return { ...given, parts: [{ ...transistor!, ...changes }, ...others] };
}

describe('BOM note', () => {
  it('of locked revisions is released and names its people and its revisions', () => {
    const note = buildBomNote(PROJECT, [Q12, Q2, Q1], ISSUE);

    expect(BomNote.parse(note)).toEqual(note);
    expect(note.released).toBe(true);
    expect(note.issue?.identification).toBe('GH-12-BOM-0007');
    expect(note.counts).toEqual({
      stages: 3,
      locked: 3,
      lines: 6,
      partsPerBoard: 15,
      partsChanged: 0,
      partsUnverified: 0,
    });
    expect(note.revisions.map(({ reference }) => reference)).toEqual(['Q1', 'Q2', 'Q12']);
    expect(note.titleBlock).toMatchObject({
      creators: ['A. Designer'],
      checkers: ['B. Checker'],
      approvers: ['C. Approver'],
    });
    expect([stagesText(note), statusText(note), occasionText(note)]).toEqual([
      '3, all locked',
      'Released',
      'Issued 2026-03-10, 14:52 Z',
    ]);
    expect(dataText(note)).toEqual({ label: 'Data, all verified', value: 'unchanged since lock' });
    expect(signedText(note.revisions[0]!)).toBe('2026-02-18');
    expect(shortHash(note.revisions[0]!.hash!)).toBe('41d7 0b93 c6f8');
  });

  it('with one revision not locked is not released and has no approver', () => {
    const note = buildBomNote(PROJECT, [Q1, Q12_IN_CHECK], PREVIEW);

    expect(note.released).toBe(false);
    expect(note.titleBlock.approvers).toEqual([]);
    expect([stagesText(note), statusText(note)]).toEqual(['2, of these 1 locked', 'Not released']);
    expect(note.cautions[0]).toEqual({
      text: 'Q12 B is in check. Nothing may be bought or built from this sheet.',
      flagged: true,
    });
  });

  it('says what an unlocked revision lacks', () => {
    const draft = {
      ...Q12_IN_CHECK,
      stateWord: 'Draft',
      evaluation: { verdict: 'fail', baseResistorOhm: null },
    };
    expect(cautions(Q1, draft)[0]).toBe(
      'Q12 B is a draft and fails. Nothing may be bought or built from this sheet.',
    );
  });

  it.each([
    ['a revision that is not locked', [Q1, Q12_IN_CHECK]],
    ['no revision at all', []],
  ])('cannot be issued of %s', (_, sources) => {
    expect(() => buildBomNote(PROJECT, sources, ISSUE)).toThrow(RangeError);
  });

  it('of nothing is not released', () => {
    expect(buildBomNote(PROJECT, [], PREVIEW)).toMatchObject({ released: false, lines: [] });
  });

  it('says which part data changed since the lock', () => {
    const changed = withPart(Q1, { latestRevision: 3 });
    const note = buildBomNote(PROJECT, [changed, Q2], ISSUE);

    expect(note.released).toBe(true);
    expect(note.revisions[0]?.state).toBe('Locked, data changed');
    expect(note.cautions[0]?.text).toBe(
      '2N3904: data changed after Q1 A was locked (part revision 2, now 3); a re-check is due.',
    );
    expect(dataText(note).value).toBe('1 part changed since lock');
  });

  it('labels unverified data', () => {
    const note = buildBomNote(PROJECT, [withPart(Q1, { verified: false })], ISSUE);
    expect(dataText(note)).toEqual({ label: 'Data', value: '1 line unverified' });
    expect(note.cautions[0]?.text).toBe('Part data not verified: line 1.');
  });

  it('announces the revision that will replace a locked one', () => {
    const successor = { letter: 'B', stateWord: 'Draft' };
    expect(cautions({ ...Q1, successor })[0]).toBe(
      'Q1 B (Draft) is under way and will replace Q1 A.',
    );
  });

  it('says that the clamp must be fitted wherever its coil is', () => {
    const other = source(
      { reference: 'Q3', load: { ...Q1.definition.load, resistanceOhm: 1100 } as never },
      { load: 'K9' },
    );
    expect(cautions(Q1, Q2, other)).toContain(
      'Coils store energy: line 5 must be fitted wherever line 6 or 7 is.',
    );
  });

  it('names the stage whose coil has no clamp', () => {
    const bare = source({ reference: 'Q3', clamp: { kind: 'none' } });
    expect(cautions(bare)).toContain(
      'No clamp is fitted at Q3: the transistor takes the coil’s energy.',
    );
  });

  it('says that another transistor needs a new revision, by line', () => {
    const pnp = source({
      reference: 'Q3',
      transistor: { ...Q1.definition.transistor, partNumber: 'BC337' },
    });
    expect(cautions(Q1)).toContain(
      'Replacing a part in line 1 needs a new revision of its stages.',
    );
    expect(cautions(Q1, pnp)).toContain(
      'Replacing a part in lines 1 and 2 needs a new revision of its stages.',
    );
  });

  it('names designators that are missing or used twice', () => {
    const twice = source(
      { reference: 'Q3' },
      { baseResistor: 'R4', shuntResistor: 'R9', load: 'K9', clamp: 'D8' },
    );
    expect(cautions(Q1, twice)).toContain('R4 names more than one part: RB of Q1 and RB of Q3.');
    expect(cautions(source({ reference: 'Q3', shuntResistor: null }))).toContain(
      'No designator is given for RB of Q3, clamp diode of Q3 and load of Q3.',
    );
  });

  it('carries the standing cautions', () => {
    const text = cautions(Q1).join(' ');
    expect(text).toContain('replace neither the current data sheet');
    expect(text).toContain('a licensed practitioner decides');
  });
});
