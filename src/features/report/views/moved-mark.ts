import type { ReadingMarks } from '../editor/reading-marks.ts';
import { seenOnce } from './seen-once.ts';

/**
 * The old value of one number in the text, struck before the new one from when it moved until its line is visited.
 * A number counts as read for the first time when it comes into view.
 */
export class MovedMark {
  private label = '';
  private key = '';
  private text: string | null = null;
  private before: string | null = null;
  private stopWaiting: (() => void) | undefined;

  constructor(
    private readonly dom: HTMLElement,
    private readonly marks: ReadingMarks | null,
  ) {}

  /** @param text - as the number reads now; null: its source is gone, so that nothing is compared */
  show(key: string, text: string | null): void {
    if (key !== this.key) this.before = null;
    [this.key, this.text] = [key, text];
    this.label = this.dom.getAttribute('aria-label') ?? '';
    const last = text === null ? null : (this.marks?.lastRead(key) ?? null);
    if (text !== null && last === null) {
      this.stopWaiting ??= seenOnce(this.dom, () => this.keep());
    }
    if (last !== null && this.before === null) this.before = last;
    if (text === null || this.before === text) this.before = null;
    this.draw();
  }

  visit(): void {
    if (this.before === null) return;
    this.before = null;
    this.keep();
    this.draw();
  }

  forget(): void {
    this.stopWaiting?.();
  }

  private keep(): void {
    if (this.text !== null) this.marks?.read(this.key, this.text);
  }

  private draw(): void {
    const { dom, before, label } = this;
    if (before === null) delete dom.dataset.before;
    else dom.dataset.before = before;
    dom.setAttribute('aria-label', before === null ? label : `${label}, moved from ${before}`);
  }
}
