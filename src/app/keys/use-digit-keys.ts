import { useEffect } from 'react';
import { useNavigate } from 'react-router-dom';
import { digitKeys } from '#src/lib/preferences/digit-keys.ts';
import { useStore } from '#src/lib/store/use-store.ts';

/** Digits go to places, in the order given from 1; "0" goes to the last named. Never inside text. */
export function useDigitKeys(places: readonly string[], zero: string): void {
  const isOn = useStore(digitKeys) === 'on';
  const navigate = useNavigate();
  const joined = places.join('\n');
  useEffect(() => {
    if (!isOn) return;
    const onKey = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.ctrlKey || event.altKey || event.metaKey || event.repeat) return;
      if (takesText(event.target) || document.querySelector('[role=dialog][data-state=open]')) return;
      const to = event.key === '0' ? zero : placeAt(joined.split('\n'), event.key);
      if (to === undefined || to === '') return;
      event.preventDefault();
      void navigate(to);
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [isOn, joined, zero, navigate]);
}

function placeAt(places: readonly string[], key: string): string | undefined {
  return /^[1-9]$/.test(key) ? places[Number(key) - 1] : undefined;
}

function takesText(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable ||
      target.closest('input, textarea, select, [role=textbox], [role=listbox]') !== null)
  );
}
