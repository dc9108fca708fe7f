import { useMemo } from 'react';
import type { Model } from '#shared/evidence/evidence.ts';
import { Katex } from '#src/components/katex.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { equationView, unitsSentence } from '../view/equation-view.ts';

/** The equations of a model as read, and whether their units agree. */
export function EquationList({ model }: { readonly model: Model }) {
  const evidence = useEvidence();
  const views = useMemo(
    () => model.equations.map(({ defines, expr }) => equationView(defines, expr, evidence)),
    [model, evidence],
  );
  const agreed = unitsSentence(model, views);
  return (
    <>
      <dl className="mt-3.5 border-y border-hair py-3 text-[16.5px]">
        {views.map(({ quantity, latex, typed, fault }, index) => (
          <div key={model.equations[index]?.defines} className="flex min-h-10 flex-wrap items-center gap-y-1">
            <dt className="w-26 flex-none pr-3 text-xs text-ink-3">
              {quantity?.name ?? 'a quantity that is gone'}
            </dt>
            <dd className="min-w-0 flex-1">
              <div
                className="relative overflow-x-auto py-1"
                role="group"
                aria-label={`${quantity?.name ?? 'formula'}, formula`}
                tabIndex={0}
              >
                {latex ? <Katex latex={latex} /> : <code className="font-code text-sm">{typed}</code>}
              </div>
            </dd>
            {fault && (
              <Notice title={`Formula ${index + 1}.`} className="w-full">
                {fault.sentence}
              </Notice>
            )}
          </div>
        ))}
      </dl>
      {agreed && <p className="mt-2 text-xs text-ink-2">{agreed}</p>}
    </>
  );
}
