import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import { claimLine } from '#shared/report/claim-line.ts';
import type { ClaimAttributes } from '#shared/report/schema/claim-node.ts';
import { Notice } from '#src/components/notice.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { VerdictMark } from '#src/components/verdict.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';

/** A claim held by its bracket: number, sentence, verdict, and by what measure. */
export function ClaimBlockView({ node, selected }: NodeViewProps) {
  const { anchor, claim } = node.attrs as ClaimAttributes;
  const { evidence, findings } = useFindingsSnapshot();
  const line = claimLine(claim, evidence, findings);
  return (
    <NodeViewWrapper
      className="report-claim"
      id={anchor}
      data-selected={selected || undefined}
      contentEditable={false}
    >
      {line ? (
        <>
          <p className="report-claim-text">
            <small>Claim {line.n}</small>
            {line.text}
          </p>
          <VerdictMark verdict={line.verdict} />
          <p className="report-claim-why">
            <SentenceText text={line.why} />
          </p>
        </>
      ) : (
        <Notice title="This claim is gone.">
          It was removed from the claim sheet. Delete it here too, or put in another.
        </Notice>
      )}
    </NodeViewWrapper>
  );
}
