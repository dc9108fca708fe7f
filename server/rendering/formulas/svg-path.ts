import { length } from '../pdf/operators.ts';

const TOKEN = /[a-zA-Z]|[-+]?(?:\d*\.\d+|\d+\.?)(?:e[-+]?\d+)?/gu;

const cache = new Map<string, string>();

/** SVG path data as PDF path operators, in the path's own units. KaTeX's paths use M L H V C S Q T A and Z. */
export function pathOperators(data: string): string {
  const known = cache.get(data);
  if (known !== undefined) return known;
  const operators = new PathReader(data).read();
  cache.set(data, operators);
  return operators;
}

class PathReader {
  private readonly tokens: readonly string[];
  private index = 0;
  private readonly out: string[] = [];
  private x = 0;
  private y = 0;
  private startX = 0;
  private startY = 0;
  /** Last control point, for S and T. */
  private controlX = 0;
  private controlY = 0;

  constructor(data: string) {
    this.tokens = data.match(TOKEN) ?? [];
  }

  read(): string {
    let command = '';
    while (this.index < this.tokens.length) {
      const token = this.tokens[this.index] ?? '';
      if (/[a-zA-Z]/u.test(token)) {
        command = token;
        this.index += 1;
      } else if (command === '') {
        this.index += 1;
        continue;
      }
      this.step(command);
      if (command === 'M') command = 'L';
      if (command === 'm') command = 'l';
      if (command === 'z' || command === 'Z') command = '';
    }
    return this.out.join('\n');
  }

  private number(): number {
    const value = Number(this.tokens[this.index]);
    this.index += 1;
    return Number.isFinite(value) ? value : 0;
  }

  private point(relative: boolean): [number, number] {
    const x = this.number() + (relative ? this.x : 0);
    const y = this.number() + (relative ? this.y : 0);
    return [x, y];
  }

  private step(command: string): void {
    const relative = command === command.toLowerCase();
    switch (command.toUpperCase()) {
      case 'M': {
        const [x, y] = this.point(relative);
        this.to(x, y);
        [this.startX, this.startY] = [x, y];
        this.out.push(`${length(x)} ${length(y)} m`);
        return;
      }
      case 'L': {
        const [x, y] = this.point(relative);
        this.line(x, y);
        return;
      }
      case 'H':
        this.line(this.number() + (relative ? this.x : 0), this.y);
        return;
      case 'V':
        this.line(this.x, this.number() + (relative ? this.y : 0));
        return;
      case 'C': {
        const [x1, y1] = this.point(relative);
        const [x2, y2] = this.point(relative);
        this.curve(x1, y1, x2, y2, ...this.point(relative));
        return;
      }
      case 'S': {
        const [x1, y1] = [2 * this.x - this.controlX, 2 * this.y - this.controlY];
        const [x2, y2] = this.point(relative);
        this.curve(x1, y1, x2, y2, ...this.point(relative));
        return;
      }
      case 'Q': {
        const [x1, y1] = this.point(relative);
        this.quadratic(x1, y1, ...this.point(relative));
        return;
      }
      case 'T': {
        const [x1, y1] = [2 * this.x - this.controlX, 2 * this.y - this.controlY];
        this.quadratic(x1, y1, ...this.point(relative));
        return;
      }
      case 'A': {
        // KaTeX's arcs are corners of less than a line's width; a chord is the same at any size it is printed.
        this.index += 5;
        const [x, y] = this.point(relative);
        this.line(x, y);
        return;
      }
      case 'Z':
        this.out.push('h');
        this.to(this.startX, this.startY);
        return;
      default:
        this.index += 1;
    }
  }

  private to(x: number, y: number): void {
    [this.x, this.y, this.controlX, this.controlY] = [x, y, x, y];
  }

  private line(x: number, y: number): void {
    this.out.push(`${length(x)} ${length(y)} l`);
    this.to(x, y);
  }

  private curve(x1: number, y1: number, x2: number, y2: number, x: number, y: number): void {
    this.out.push(`${[x1, y1, x2, y2, x, y].map(length).join(' ')} c`);
    this.to(x, y);
    [this.controlX, this.controlY] = [x2, y2];
  }

  private quadratic(x1: number, y1: number, x: number, y: number): void {
    const toThird = (from: number, control: number) => from + (2 / 3) * (control - from);
    const [fromX, fromY] = [this.x, this.y];
    this.curve(toThird(fromX, x1), toThird(fromY, y1), toThird(x, x1), toThird(y, y1), x, y);
    [this.controlX, this.controlY] = [x1, y1];
  }
}
