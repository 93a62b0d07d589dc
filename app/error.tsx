'use client';

/** A page that failed while it was made. */
export default function PageError({ reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <main id="main" className="mx-auto max-w-page px-4 pt-12">
      <h1>This page could not be put together</h1>
      <p className="mt-4 max-w-measure">
        The fault is ours, or the records cannot be reached just now. Nothing that you wrote is lost: what you
        typed stays on this device until it is saved.
      </p>
      <p className="mt-6 flex flex-wrap gap-3">
        <button className="action" onClick={reset}>
          Try again
        </button>
        <a className="action-plain" href="/">
          To the start
        </a>
      </p>
    </main>
  );
}
