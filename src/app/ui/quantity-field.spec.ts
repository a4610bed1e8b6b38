import { ChangeDetectionStrategy, Component, provideZonelessChangeDetection } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { QuantityField } from './quantity-field.ts';
import { QuantitySpanField, type EnteredSpan } from './quantity-span-field.ts';

@Component({
  imports: [QuantityField, QuantitySpanField, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<label for="rb">RB</label>
    <app-quantity-field
      inputId="rb"
      unit="Ohm"
      [min]="1"
      [max]="1e7"
      [optional]="true"
      [steps]="[560, 620, 680, 6200]"
      [formControl]="resistor"
    />
    <app-quantity-span-field
      inputId="supply"
      label="Supply"
      unit="V"
      [min]="1"
      [max]="60"
      [formControl]="supply"
    />`,
})
class Host {
  readonly resistor = new FormControl<number | null>(1440);
  readonly supply = new FormControl<EnteredSpan>({ min: 21.6, max: 26.4 }, { nonNullable: true });
}

describe('QuantityField', () => {
  let fixture: ComponentFixture<Host>;
  const page = () => fixture.nativeElement as HTMLElement;
  const box = (id = 'rb') => page().querySelector<HTMLInputElement>(`#${id}`)!;
  const key = async (name: string) => {
    box().dispatchEvent(
      new KeyboardEvent('keydown', { key: name, bubbles: true, cancelable: true }),
    );
    await fixture.whenStable();
  };
  const type = async (text: string, id = 'rb') => {
    const input = box(id);
    input.focus();
    input.value = text;
    input.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const leave = async (id = 'rb') => {
    box(id).dispatchEvent(new Event('blur'));
    await fixture.whenStable();
  };
  const message = () => page().querySelector('[role=status]')?.textContent.trim() ?? '';
  const shown = () => [box().value, page().querySelector('.unit')?.textContent];

  beforeEach(async () => {
    TestBed.configureTestingModule({ providers: [provideZonelessChangeDetection()] });
    fixture = TestBed.createComponent(Host);
    document.body.append(fixture.nativeElement as HTMLElement);
    await fixture.whenStable();
  });
  afterEach(() => {
    page().remove();
  });

  it('shows the figure and its unit in columns of their own', () => {
    expect(shown()).toEqual(['1.44', 'kΩ']);
  });

  it.each([
    ['4k7', 4700],
    ['2,2k', 2200],
    ['4.7 kΩ', 4700],
    ['620', 620],
  ])('takes %s while it is typed and shows it as a figure on leaving', async (text, valueOhm) => {
    await type(text);
    expect(fixture.componentInstance.resistor.value).toBe(valueOhm);
    await leave();
    expect(box().value).toMatch(/^[\d.]+$/);
    expect(message()).toBe('');
  });

  it('reads arithmetic with units', async () => {
    await type('24V/10mA');
    await vi.waitFor(() => {
      expect(fixture.componentInstance.resistor.value).toBe(2400);
    }, 4000);
    await fixture.whenStable();
    expect(message()).toContain('2.4');
  });

  it('keeps the value and says what is wrong only after the field is left', async () => {
    await type('lots');
    expect(message()).toBe('');
    expect(fixture.componentInstance.resistor.invalid).toBe(true);
    await leave();
    expect(message()).toContain('4.7 kΩ');
    expect(box().getAttribute('aria-invalid')).toBe('true');
    expect(fixture.componentInstance.resistor.value).toBe(1440);
  });

  it('asks before it takes a grouping that could be a decimal', async () => {
    await type('1,234');
    expect(message()).toContain('Did you mean');
    expect(fixture.componentInstance.resistor.value).toBe(1440);
    await key('Enter');
    expect([1.234, 1234]).toContain(fixture.componentInstance.resistor.value);
    expect(fixture.componentInstance.resistor.valid).toBe(true);
  });

  it('guards milliohm: outside the range it is refused in words', async () => {
    await type('4m7');
    await leave();
    expect(message()).not.toBe('');
    expect(fixture.componentInstance.resistor.value).toBe(1440);
  });

  it('steps along the preferred values by arrow and by decade, and never by wheel', async () => {
    await type('620');
    await key('ArrowUp');
    expect(fixture.componentInstance.resistor.value).toBe(680);
    await key('ArrowDown');
    await key('ArrowDown');
    expect(fixture.componentInstance.resistor.value).toBe(560);
    await key('ArrowUp');
    await key('PageUp');
    expect(fixture.componentInstance.resistor.value).toBe(6200);
    box().dispatchEvent(new WheelEvent('wheel', { deltaY: 100 }));
    expect(fixture.componentInstance.resistor.value).toBe(6200);
  });

  it('may be emptied where it is optional', async () => {
    await type('');
    await leave();
    expect(fixture.componentInstance.resistor.value).toBeNull();
    expect(fixture.componentInstance.resistor.valid).toBe(true);
  });

  it('shows figure and unit whole and selected on entering, so that typing replaces them', async () => {
    box().focus();
    expect(box().value.replace('\u00a0', ' ')).toBe('1.44 kΩ');
    expect([box().selectionStart, box().selectionEnd]).toEqual([0, box().value.length]);
    await fixture.whenStable();
    expect([box().selectionStart, box().selectionEnd]).toEqual([0, box().value.length]);
  });

  it('holds both ends of a pair and refuses them in the wrong order', async () => {
    await type('30', 'supply-max');
    expect(fixture.componentInstance.supply.value).toEqual({ min: 21.6, max: 30 });
    await type('40', 'supply');
    expect(fixture.componentInstance.supply.invalid).toBe(true);
  });
});
