import { type NodeViewProps, NodeViewWrapper, ReactNodeViewRenderer } from '@tiptap/react';
import type { Zone } from '#shared/document/define-block.ts';
import { LiveValueView } from './live-value-view.tsx';

/** The live value inside the editor: the same as in the reading view, and one piece for the caret. */
function LiveValueEdit({ node, selected }: NodeViewProps) {
  const { quantity, printed, zone } = node.attrs as { quantity: string; printed: string; zone: Zone | null };
  return (
    <NodeViewWrapper as="span" className={selected ? 'live-chosen' : undefined}>
      <LiveValueView quantityId={quantity} printed={printed} zone={zone} isTabStop={false} />
    </NodeViewWrapper>
  );
}

export const liveValueNodeView = () => ReactNodeViewRenderer(LiveValueEdit, { as: 'span' });
