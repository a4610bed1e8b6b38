import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  input,
  output,
  viewChild,
  ViewEncapsulation,
} from '@angular/core';
import type { Drawing, DrawingPart, PartKey } from '../../../shared/report/schematic/drawing.ts';
import { paintDrawing } from './paint-drawing.ts';

/**
 * The circuit of a stage on quadrille paper. The picture is one image with its live values as name; every part
 * of it is also a button that chooses the part.
 */
@Component({
  selector: 'app-schematic-view',
  templateUrl: './schematic-view.html',
  styleUrl: './schematic-view.scss',
  encapsulation: ViewEncapsulation.None,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SchematicView {
  readonly drawing = input.required<Drawing>();
  readonly selected = input<PartKey | null>(null);
  readonly chosen = output<PartKey>();

  private readonly paper = viewChild.required<ElementRef<HTMLElement>>('paper');
  /** Reading order of the buttons: as the drawing lists its parts, from drive to load. */
  protected readonly parts = computed(() =>
    [...this.drawing().parts].sort((a, b) => a.box.x - b.box.x || a.box.y - b.box.y),
  );

  constructor() {
    effect(() => {
      paintDrawing(this.paper().nativeElement, this.drawing(), this.selected());
    });
  }

  /** Share of the drawing's width or height, so that the buttons scale with the picture. */
  protected share(part: DrawingPart, side: 'left' | 'top' | 'width' | 'height'): number {
    const { width, height } = this.drawing();
    const { box } = part;
    const [length, whole] = {
      left: [box.x, width],
      top: [box.y, height],
      width: [box.width, width],
      height: [box.height, height],
    }[side] as [number, number];
    return (length / whole) * 100;
  }
}
