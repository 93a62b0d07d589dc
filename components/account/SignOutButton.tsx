/** Ends this device's session; a plain form, so that it needs no script. */
export function SignOutButton() {
  return (
    <form method="post" action="/sign-out">
      <button type="submit" className="action-plain">
        Sign out
      </button>
    </form>
  );
}
