import { NodeViewWrapper, type NodeViewProps } from '@tiptap/react';
import type { PlateAttributes } from '#shared/report/schema/plate-node.ts';
import { Field } from '#src/components/field.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useNumbers } from '../components/report-context.ts';
import { Caption } from './caption.tsx';

/** A photo or film still, with what it shows for those who cannot see it. */
export function PlateBlock({ node, editor, updateAttributes, selected }: NodeViewProps) {
  const { anchor, sha, width, height, caption, alt } = node.attrs as PlateAttributes;
  const { address, frozen } = useProblem();
  const own = `/api/teams/${encodeURIComponent(address.team)}/problems/${address.number}/files/${sha}`;
  const number = useNumbers().plates.get(anchor);
  return (
    <NodeViewWrapper as="figure" className="report-figure" id={anchor} data-selected={selected || undefined}>
      <div contentEditable={false}>
        <img
          src={frozen ? frozen.addressOfPicture(sha) : own}
          width={width}
          height={height}
          alt={alt}
          loading="lazy"
          className="mx-auto h-auto max-h-[520px] w-auto max-w-full"
        />
        {editor.isEditable && (selected || alt === '') && (
          <Field
            label="What it shows, for those who cannot see it"
            frameClassName="mt-3 font-ui"
            maxLength={1000}
            defaultValue={alt}
            error={
              alt === ''
                ? 'Say what the plate shows, like "the can on its wedge, seen from the side".'
                : undefined
            }
            onBlur={(event) => updateAttributes({ alt: event.target.value.trim() })}
            onKeyDown={(event) => event.stopPropagation()}
          />
        )}
      </div>
      <Caption
        kind="Plate"
        number={number}
        text={caption}
        isEditable={editor.isEditable}
        onKeep={(next) => updateAttributes({ caption: next })}
      />
    </NodeViewWrapper>
  );
}
