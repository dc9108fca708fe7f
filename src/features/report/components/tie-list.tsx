import type { Editor } from '@tiptap/react';
import { useEffect, useRef, useState, type RefObject } from 'react';
import { findTieTrigger } from '#shared/report/tie-trigger.ts';
import { optionsForSymbol, quantityOfSymbol, type ValueOption } from '#shared/report/value-options.ts';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';
import { putIn } from '../editor/put-in.ts';
import { ListAtPlace, optionId } from './list-at-place.tsx';

const LIST = 'tie-list';
const MOST = 12;

interface Tying {
  readonly from: number;
  readonly to: number;
  readonly symbol: string;
  readonly name: string;
  readonly options: readonly ValueOption[];
  readonly top: number;
  readonly left: number;
}

/** Opens at the line when a symbol and ± are written, and ties the number that is taken. */
export function TieList({
  editor,
  page,
}: {
  readonly editor: Editor;
  readonly page: RefObject<HTMLElement | null>;
}) {
  const { store } = useProblem();
  const [tying, setTying] = useState<Tying | null>(null);
  const [active, setActive] = useState(0);
  const left = useRef<number | null>(null);

  useEffect(() => {
    const look = () => {
      const found = page.current ? tyingAt(editor, store.get(), page.current) : null;
      if (found && left.current === found.from) return;
      if (!found) left.current = null;
      setTying(found);
      setActive(0);
    };
    editor.on('update', look);
    editor.on('selectionUpdate', look);
    return () => {
      editor.off('update', look);
      editor.off('selectionUpdate', look);
    };
  }, [editor, page, store]);

  useEffect(() => {
    const { dom } = editor.view;
    if (!tying) return undefined;
    const take = (option: ValueOption) => {
      putIn.value(editor, option.ref, option.text, { from: tying.from, to: tying.to });
      say(`${option.text} is tied: ${option.words}.`);
      setTying(null);
    };
    dom.setAttribute('aria-controls', LIST);
    dom.setAttribute('aria-activedescendant', optionId(LIST, active));
    const onKey = (event: KeyboardEvent) => {
      const count = tying.options.length;
      const option = tying.options[active];
      if (event.key === 'ArrowDown') setActive((active + 1) % count);
      else if (event.key === 'ArrowUp') setActive((active + count - 1) % count);
      else if (event.key === 'Enter' && option) take(option);
      else if (event.key === 'Escape') {
        left.current = tying.from;
        setTying(null);
      } else return;
      event.preventDefault();
      event.stopPropagation();
    };
    dom.addEventListener('keydown', onKey, true);
    return () => {
      dom.removeEventListener('keydown', onKey, true);
      dom.removeAttribute('aria-controls');
      dom.removeAttribute('aria-activedescendant');
    };
  }, [editor, tying, active]);

  if (!tying) return null;
  return (
    <ListAtPlace
      id={LIST}
      label={`Values of ${tying.name}`}
      question={
        <>
          Which <QuantitySymbol symbol={tying.symbol} />, {tying.name}?
        </>
      }
      options={tying.options}
      active={active}
      place={{ top: tying.top, left: tying.left }}
      onTake={(option) => {
        putIn.value(editor, option.ref, option.text, { from: tying.from, to: tying.to });
        setTying(null);
      }}
    />
  );
}

function tyingAt(
  editor: Editor,
  snapshot: ReturnType<ReturnType<typeof useProblem>['store']['get']>,
  page: HTMLElement,
): Tying | null {
  const { selection } = editor.state;
  if (!snapshot || !selection.empty || !editor.isEditable) return null;
  const { $from } = selection;
  const before = $from.parent.textBetween(0, $from.parentOffset, undefined, '\ufffc');
  const trigger = findTieTrigger(before);
  const quantity = trigger ? quantityOfSymbol(trigger.symbol, snapshot.evidence) : null;
  if (!trigger || !quantity) return null;
  const narrowing = trigger.narrowing.toLowerCase();
  const options = optionsForSymbol(
    trigger.symbol,
    snapshot.evidence,
    snapshot.findings,
    before.slice(0, trigger.from),
  )
    .filter(({ words, text }) => `${words} ${text}`.toLowerCase().includes(narrowing))
    .slice(0, MOST);
  if (options.length === 0) return null;
  const caret = editor.view.coordsAtPos($from.pos);
  const frame = page.getBoundingClientRect();
  return {
    from: $from.start() + trigger.from,
    to: $from.pos,
    symbol: quantity.symbol,
    name: quantity.name,
    options,
    top: caret.bottom - frame.top + 6,
    left: Math.max(0, Math.min(caret.left - frame.left - 60, frame.width - 400)),
  };
}
