/** What stands below every page. */
export function PageFoot() {
  return (
    <footer className="mx-auto mt-16 max-w-page border-t border-rule px-4 py-6 text-note text-soft">
      <p className="max-w-measure">
        Anything aloft, near a power line or over people is for a qualified arborist; local rules come first.
      </p>
      <p className="mt-2 flex flex-wrap gap-x-5">
        <a href="/glossary" className="inline-flex min-h-finger items-center">
          Glossary
        </a>
        <a href="/data" className="inline-flex min-h-finger items-center">
          Open data
        </a>
        <a href="/guides/counting" className="inline-flex min-h-finger items-center">
          How to count
        </a>
      </p>
    </footer>
  );
}
