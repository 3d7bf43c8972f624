import { Fragment, useMemo } from 'react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { HazardMark } from '../ui/hazard-mark.tsx'
import type { HazardClass } from '../ui/hazard-mark.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { ArticleLoop } from './article-loop.tsx'
import { partsOf, proseOf, signalOf, targetOf } from './prose-source.ts'

const hazardHeadings: readonly { begins: string; hazard: HazardClass }[] = [
  { begins: 'nothing opened, can make metal live', hazard: 'closed-can-energize' },
  { begins: 'nothing opened', hazard: 'closed' },
  { begins: 'cover off, proved dead', hazard: 'open-dead' },
  { begins: 'cover off, live', hazard: 'open-live' },
]

const plain = new Set([
  'p',
  'br',
  'hr',
  'ul',
  'li',
  'strong',
  'em',
  'del',
  'code',
  'pre',
  'thead',
  'tbody',
  'tr',
  'th',
  'td',
])

const inside = (node: Node): ReactNode[] =>
  [...node.childNodes].map((child, index) => <Fragment key={index}>{drawn(child)}</Fragment>)

function link(element: Element): ReactNode {
  const target = targetOf(element.getAttribute('href'))
  if (target === undefined) return <>{inside(element)}</>
  return target.kind === 'page' ? (
    <Link to={target.to}>{inside(element)}</Link>
  ) : (
    <a href={target.href} rel="noopener noreferrer">
      {inside(element)}
    </a>
  )
}

/** A quotation that begins with a signal word in bold is a signal panel; any other stays a quotation. */
function quotation(element: Element): ReactNode {
  const signal = signalOf(element)
  const first = element.firstElementChild
  if (signal === undefined || first === null) return <blockquote>{inside(element)}</blockquote>
  const rest = first.cloneNode(true)
  rest.firstChild?.remove()
  if (rest.firstChild instanceof Text) rest.firstChild.data = rest.firstChild.data.replace(/^\s*[:.]?\s*/, '')
  const others = [...element.children].slice(1)
  return (
    <SignalPanel word={signal} slim={signal === 'caution' || signal === 'notice'}>
      <p>{inside(rest)}</p>
      {others.map((other, index) => (
        <Fragment key={index}>{drawn(other)}</Fragment>
      ))}
    </SignalPanel>
  )
}

function heading(element: Element): ReactNode {
  const text = (element.textContent ?? '').trim()
  const marked = hazardHeadings.find((one) => text.toLowerCase().startsWith(one.begins))
  if (marked !== undefined)
    return (
      <h3 className="prose-hazard">
        <HazardMark hazard={marked.hazard} words={text} />
      </h3>
    )
  return element.tagName === 'H1' || element.tagName === 'H2' ? (
    <h2>{inside(element)}</h2>
  ) : (
    <h3>{inside(element)}</h3>
  )
}

/** Draws one node of what `proseOf` let through; a tag that is not known here leaves its words only. */
function drawn(node: Node): ReactNode {
  if (node instanceof Text) return node.data
  if (!(node instanceof Element)) return null
  const tag = node.tagName.toLowerCase()
  if (/^h[1-6]$/.test(tag)) return heading(node)
  if (tag === 'a') return link(node)
  if (tag === 'blockquote') return quotation(node)
  if (tag === 'ol') return <ol className="prose-do">{inside(node)}</ol>
  if (tag === 'table')
    return (
      <div className="prose-table" role="region" aria-label="Table" tabIndex={0}>
        <table>{inside(node)}</table>
      </div>
    )
  if (!plain.has(tag)) return <>{inside(node)}</>
  const Tag = tag as 'p'
  return tag === 'br' || tag === 'hr' ? <Tag /> : <Tag>{inside(node)}</Tag>
}

/** One stretch of an article's text; `lead` is the index of its larger paragraph, −1 for none. */
function Stretch({ nodes, lead, after }: { nodes: readonly Node[]; lead: number; after: ReactNode }) {
  return nodes.map((node, index) =>
    index === lead ? (
      <Fragment key={index}>
        <p className="prose-lead">{inside(node)}</p>
        {after}
      </Fragment>
    ) : (
      <Fragment key={index}>{drawn(node)}</Fragment>
    ),
  )
}

/** An article's text. Its first paragraph stands larger; `after` (a drawing) follows it. */
export function Prose({ markdown, after }: { markdown: string; after?: ReactNode }) {
  const parts = useMemo(() => {
    const made = partsOf(markdown).map((part) =>
      part.kind === 'loop'
        ? part
        : {
            kind: 'text' as const,
            nodes: [...proseOf(part.markdown).childNodes].filter(
              (node) => node.textContent?.trim() !== '' || node instanceof Element,
            ),
          },
    )
    const isLead = (node: Node) => node instanceof Element && node.tagName === 'P'
    const first = made.findIndex((part) => part.kind === 'text' && part.nodes.some(isLead))
    return made.map((part, index) =>
      part.kind === 'loop' ? part : { ...part, lead: index === first ? part.nodes.findIndex(isLead) : -1 },
    )
  }, [markdown])
  const led = parts.some((part) => part.kind === 'text' && part.lead >= 0)
  return (
    <div className="prose">
      {!led && after}
      {parts.map((part, index) =>
        part.kind === 'loop' ? (
          <ArticleLoop key={index} block={part.block} />
        ) : (
          <Stretch key={index} nodes={part.nodes} lead={part.lead} after={after} />
        ),
      )}
    </div>
  )
}
