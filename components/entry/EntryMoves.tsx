import { ConfirmButton } from '@/components/form/ConfirmButton';
import type { EntryView } from '@/lib/entries/schema';

/** Taking an entry back, and bringing it back again; asked once more before anything goes. */
export function EntryMoves({ entry }: { entry: EntryView }) {
  const url = `/api/entries/${entry.id}`;
  switch (entry.status) {
    case 'merged':
      return null;
    case 'withdrawn':
      return (
        <ConfirmButton
          label="Make it a draft again"
          question="It becomes a draft that you alone see, until you send it to the bench."
          yes="Make it a draft"
          no="Leave it withdrawn"
          method="POST"
          url={`${url}/draft`}
          then={`/entries/${entry.id}/edit`}
        />
      );
    case 'draft':
      return (
        <ConfirmButton
          label="Delete draft"
          question="This draft and its readings go for good."
          yes="Delete it"
          no="Keep it"
          method="DELETE"
          url={url}
          ifMatch={entry.revision}
          then="/entries"
        />
      );
    default:
      return (
        <ConfirmButton
          label="Withdraw"
          question="It leaves the public pages and the figures. Nothing is lost: you can make it a draft again."
          yes="Withdraw it"
          no="Leave it"
          method="DELETE"
          url={url}
          ifMatch={entry.revision}
        />
      );
  }
}
