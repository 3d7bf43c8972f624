import DOMPurify from 'dompurify'
import { Marked } from 'marked'
import { tooMuchMarkdown } from '../../rules/edition/markdown-limits.ts'

const inText = (text: string) =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;')

// Articles are written in Markdown alone: HTML in them is shown as the text it is, pictures as their words.
const marked = new Marked({
  gfm: true,
  renderer: { html: ({ text }) => inText(text), image: ({ text }) => inText(text) },
})

const tags =
  'h1 h2 h3 h4 h5 h6 p br hr ul ol li strong em del code pre blockquote a table thead tbody tr th td'

const signalWords = ['danger', 'warning', 'caution', 'notice'] as const
export type SignalWord = (typeof signalWords)[number]

/** The signal word that a quotation begins with, in bold; undefined for any other. */
export function signalOf(quotation: Element): SignalWord | undefined {
  const bold = quotation.firstElementChild?.firstChild
  if (bold?.nodeName !== 'STRONG') return undefined
  const said = (bold.textContent ?? '').replace(/[\s:.]+$/, '').toLowerCase()
  return signalWords.find((word) => word === said)
}

const rankOf = (quotation: Element) => {
  const word = signalOf(quotation)
  return word === undefined ? signalWords.length : signalWords.indexOf(word)
}

/** Of signal panels that follow one another the worst goes first, whatever order they were written in. */
function putDangerFirst(fragment: DocumentFragment): void {
  for (const quotation of [...fragment.children].filter((one) => one.tagName === 'BLOCKQUOTE')) {
    let before = quotation.previousElementSibling
    while (before?.tagName === 'BLOCKQUOTE' && rankOf(before) > rankOf(quotation)) {
      before.before(quotation)
      before = quotation.previousElementSibling
    }
  }
}

const mostShown = 20_000

/** A text that can't be drawn in reasonable time, undrawn: what is the matter, and how it begins. */
function asItIs(fault: string, markdown: string): DocumentFragment {
  const fragment = document.createDocumentFragment()
  const [said, begins] = [document.createElement('p'), document.createElement('pre')]
  said.textContent = `This text can’t be drawn. ${fault}`
  begins.textContent = markdown.slice(0, mostShown)
  fragment.append(said, begins)
  return fragment
}

/**
 * Markdown to a piece of a document that holds these tags, `href` and nothing else. What `prose.tsx` draws is made
 * anew from it, tag by tag: an article must get past the renderer, the purifier and that list to do harm.
 */
export function proseOf(markdown: string): DocumentFragment {
  const tooMuch = tooMuchMarkdown(markdown)
  if (tooMuch !== undefined) return asItIs(tooMuch, markdown)
  const fragment = DOMPurify.sanitize(marked.parse(markdown, { async: false }), {
    ALLOWED_TAGS: tags.split(' '),
    ALLOWED_ATTR: ['href'],
    ALLOW_DATA_ATTR: false,
    ALLOW_ARIA_ATTR: false,
    RETURN_DOM_FRAGMENT: true,
  })
  putDangerFirst(fragment)
  return fragment
}

export type Part = { kind: 'text'; markdown: string } | { kind: 'loop'; block: string }

/** An article's text, cut where a loop picture stands: a fenced block named `loop`, outside of lists and quotations. */
export function partsOf(markdown: string): Part[] {
  // Before the lexer sees it: that calls itself for each depth, too.
  if (tooMuchMarkdown(markdown) !== undefined) return [{ kind: 'text', markdown }]
  const parts: Part[] = []
  for (const token of marked.lexer(markdown)) {
    const last = parts.at(-1)
    if (token.type === 'code' && token['lang'] === 'loop')
      parts.push({ kind: 'loop', block: String(token['text']) })
    else if (last?.kind === 'text') last.markdown += token.raw
    else parts.push({ kind: 'text', markdown: token.raw })
  }
  return parts
}

export type Target = { kind: 'page'; to: string } | { kind: 'elsewhere'; href: string }

// Only pages that exist: no second slash, no backslash, no tab that a browser would read as one.
const page =
  /^\/(?:(?:articles|causes|tests)(?:\/[a-z0-9.-]+)?|check|diagnosis|editions)?(?:\?[\w%=&.+-]*)?(?:#[\w-]*)?$/

/** Where a link in an article leads, or undefined when it leads nowhere that an article may send people. */
export function targetOf(href: string | null): Target | undefined {
  if (href === null) return undefined
  if (page.test(href)) return { kind: 'page', to: href }
  if (!/^(?:https?:\/\/|mailto:)/i.test(href) || !URL.canParse(href)) return undefined
  const { protocol, href: whole } = new URL(href)
  return ['https:', 'http:', 'mailto:'].includes(protocol) ? { kind: 'elsewhere', href: whole } : undefined
}
