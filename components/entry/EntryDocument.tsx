import { Fragment, type ReactNode } from 'react';
import { renderToReactElement } from '@tiptap/static-renderer/pm/react';
import { CutBlock, PROSE, ReadingBlock } from '@/lib/documents/extensions';
import { validateDocument } from '@/lib/documents/validate';
import './prose.css';

interface Props {
  readonly doc: Record<string, unknown>;
  /** Shows the cut where the prose places it. What the document does not mention, the page adds: `mentionedBlocks`. */
  readonly renderCut: () => ReactNode;
  readonly renderReading: (id: string) => ReactNode;
}

/** The prose of a stored entry with its record blocks, made on the server; every text in it is escaped. */
export function EntryDocument({ doc, renderCut, renderReading }: Props) {
  if (validateDocument(doc).length > 0) {
    return <p className="text-soft">The prose of this record cannot be shown; its figures stand below.</p>;
  }
  const prose = renderToReactElement({
    content: doc,
    extensions: [...PROSE, CutBlock, ReadingBlock],
    options: {
      nodeMapping: {
        cut: () => <Fragment key="cut">{renderCut()}</Fragment>,
        reading: ({ node }) => (
          <Fragment key={String(node.attrs.id)}>{renderReading(String(node.attrs.id))}</Fragment>
        ),
      },
    },
  });
  return <div className="prose-record">{prose}</div>;
}
