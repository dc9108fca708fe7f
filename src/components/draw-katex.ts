import katex from 'katex';
import 'katex/dist/katex.min.css';

/** The only two classes that a formula may carry: numbers put in, measured or predicted. */
const PUT_IN_CLASSES = new Set(['fm', 'fp']);

export interface DrawingOptions {
  readonly display: boolean;
}

/**
 * Draws a formula into an element; gives a sentence where the LaTeX cannot be read. Elements are built one by one
 * (never from a string of HTML), so that a policy without inline styles holds.
 */
export function drawKatex(element: HTMLElement, latex: string, { display }: DrawingOptions): string | null {
  try {
    katex.render(latex, element, {
      displayMode: display,
      output: 'htmlAndMathml',
      throwOnError: true,
      strict: 'ignore',
      trust: ({ command, ...context }) =>
        command === '\\htmlClass' && 'class' in context && PUT_IN_CLASSES.has(context.class),
    });
    return null;
  } catch (error) {
    element.textContent = latex;
    return error instanceof katex.ParseError
      ? `This formula cannot be drawn: ${error.rawMessage}.`
      : 'This formula cannot be drawn.';
  }
}
