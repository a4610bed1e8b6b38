import { TestBed } from '@angular/core/testing';
import { Appearance } from './appearance.ts';

const key = (name: string, target: Element, modifiers: KeyboardEventInit = {}) => {
  const event = new KeyboardEvent('keydown', { key: name, ...modifiers });
  Object.defineProperty(event, 'target', { value: target });
  return event;
};

describe('Appearance', () => {
  beforeEach(() => {
    localStorage.clear();
  });

  it('keeps the choice for this browser and puts it on the page', () => {
    const appearance = TestBed.inject(Appearance);
    appearance.scheme.set('dark');
    appearance.density.set('tight');
    TestBed.tick();
    expect(document.documentElement.dataset['scheme']).toBe('dark');
    expect(document.documentElement.dataset['density']).toBe('tight');
    TestBed.resetTestingModule();
    expect(TestBed.inject(Appearance).scheme()).toBe('dark');
  });

  it('falls back to the defaults when the stored choice makes no sense', () => {
    localStorage.setItem('sinkwell.appearance', '{"scheme":"neon","density":7');
    expect(TestBed.inject(Appearance).scheme()).toBe('system');
    expect(TestBed.inject(Appearance).density()).toBe('standard');
  });

  it('lets a single key act only outside fields, without modifiers and while switched on', () => {
    const appearance = TestBed.inject(Appearance);
    const page = document.createElement('main');
    const field = document.createElement('input');
    expect(appearance.shortcutApplies(key('/', page))).toBe(true);
    expect(appearance.shortcutApplies(key('/', field))).toBe(false);
    expect(appearance.shortcutApplies(key('/', page, { ctrlKey: true }))).toBe(false);
    appearance.shortcuts.set(false);
    expect(appearance.shortcutApplies(key('/', page))).toBe(false);
  });
});
