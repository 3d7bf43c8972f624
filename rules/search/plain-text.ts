/** The words of a Markdown text on one line: for the index and for excerpts. Not a renderer. */
export function plainText(markdown: string): string {
  return (
    markdown
      // A loop picture is drawn, not read.
      .replaceAll(/^```loop$[^]*?^```$/gm, ' ')
      .replaceAll(/!?\[([^\]]*)\]\([^)]*\)/g, '$1')
      .replaceAll(/<[^>]*>/g, ' ')
      .replaceAll(/^\s{0,3}(?:#{1,6}\s+|>\s?)+/gm, '')
      .replaceAll(/^\s*(?:[-*+]|\d+[.)])\s+/gm, '')
      .replaceAll(/^\s*\|?[\s:|-]+\|?\s*$/gm, ' ')
      .replaceAll(/[*_`|]+/g, '')
      .replaceAll(/\s+/g, ' ')
      .trim()
  )
}
