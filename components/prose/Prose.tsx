/** Text written as Markdown under content/, made into safe HTML by lib/guides. */
export function Prose({ html }: { html: string }) {
  return <div className="prose-guide max-w-measure" dangerouslySetInnerHTML={{ __html: html }} />;
}
