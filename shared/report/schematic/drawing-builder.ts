import type {
  Box,
  Drawing,
  DrawingArrow,
  DrawingElement,
  DrawingText,
  PartKey,
  Point,
  Run,
  TextRole,
} from './drawing.ts';
import { placed, SYMBOLS, type SymbolName } from './symbols.ts';
import { textBox } from './text-box.ts';

interface TextOptions {
  readonly anchor?: DrawingText['anchor'];
  readonly part?: PartKey;
  readonly figure?: { readonly ref: string; readonly name: string };
}

const PADDING = 6;

/** Collects the elements of one drawing, and learns from them where each part lies. */
export class DrawingBuilder {
  readonly #elements: DrawingElement[] = [];
  readonly #labels = new Map<PartKey, string>();

  symbol(symbol: SymbolName, at: Point, part: PartKey | null, turn: 0 | 90 = 0): void {
    this.#elements.push({ kind: 'symbol', symbol, at, turn, part });
  }

  /** Coordinates in turn: x, y, x, y … */
  wire(...coordinates: readonly number[]): void {
    const points: Point[] = [];
    for (let index = 0; index + 1 < coordinates.length; index += 2) {
      points.push({ x: coordinates[index] ?? 0, y: coordinates[index + 1] ?? 0 });
    }
    const [first, last] = [points[0], points.at(-1)];
    if (first !== undefined && last !== undefined && (first.x !== last.x || first.y !== last.y)) {
      this.#elements.push({ kind: 'wire', points });
    }
  }

  dot(x: number, y: number): void {
    this.#elements.push({ kind: 'dot', at: { x, y } });
  }

  arrow(x: number, y: number, points: DrawingArrow['points']): void {
    this.#elements.push({ kind: 'arrow', at: { x, y }, points });
  }

  text(
    x: number,
    y: number,
    role: TextRole,
    runs: readonly Run[],
    options: TextOptions = {},
  ): void {
    this.#elements.push({
      kind: 'text',
      at: { x, y },
      anchor: options.anchor ?? 'start',
      role,
      runs,
      part: options.part ?? null,
      figure: options.figure ?? null,
    });
  }

  /** What a part is called aloud; makes it one that can be chosen. */
  name(part: PartKey, label: string): void {
    this.#labels.set(part, label);
  }

  finish(width: number, height: number, name: string): Drawing {
    const parts = [...this.#labels].map(([key, label]) => ({
      key,
      label,
      box: this.#area(key, width),
    }));
    return { width, height, name, elements: this.#elements, parts };
  }

  #area(part: PartKey, frameWidth: number): Box {
    const boxes = this.#elements.flatMap((element): Box[] => {
      if (element.kind === 'text' && element.part === part) return [textBox(element)];
      if (element.kind !== 'symbol' || element.part !== part) return [];
      return [bodyBox(element.symbol, element.at, element.turn)];
    });
    const left = Math.max(1, Math.min(...boxes.map(({ x }) => x)) - PADDING);
    const top = Math.min(...boxes.map(({ y }) => y)) - PADDING;
    const end = Math.max(...boxes.map(({ x, width }) => x + width)) + PADDING;
    const right = Math.min(frameWidth - 1, end);
    const bottom = Math.max(...boxes.map(({ y, height }) => y + height)) + PADDING;
    return { x: left, y: top, width: right - left, height: bottom - top };
  }
}

/** The area of a symbol in its place. */
export function bodyBox(symbol: SymbolName, at: Point, turn: 0 | 90): Box {
  const { box } = SYMBOLS[symbol];
  const a = placed(box, turn, at);
  const b = placed({ x: box.x + box.width, y: box.y + box.height }, turn, at);
  return {
    x: Math.min(a.x, b.x),
    y: Math.min(a.y, b.y),
    width: Math.abs(a.x - b.x),
    height: Math.abs(a.y - b.y),
  };
}
