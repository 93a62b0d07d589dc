type Props = { children: string; sending: boolean; progress: string };

/** Sends a form, once: while it is on its way the button says so and takes no second press. */
export function SubmitButton({ children, sending, progress }: Props) {
  return (
    <button type="submit" className="action mt-6" disabled={sending}>
      <span aria-live="polite">{sending ? progress : children}</span>
    </button>
  );
}
