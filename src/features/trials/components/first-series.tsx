import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';

/** The first row of an empty log shows the first step where its content will be. */
export function FirstSeries({ onStart }: { readonly onStart: () => void }) {
  const { quantities } = useEvidence();
  const hasReading = quantities.some(({ def }) => def.origin === 'recorded');
  return (
    <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1 border-t border-rule pt-3 text-ink-3">
      <span className="text-ink">A1</span>
      <i className="font-report text-[17px]">say what you hold fixed</i>
      <i className="font-report text-[17px]">first reading</i>
      {hasReading ? (
        <Word className="ml-auto" onClick={onStart}>
          New series
        </Word>
      ) : (
        <span className="ml-auto">Name what you read in every trial under Quantities first.</span>
      )}
    </div>
  );
}
