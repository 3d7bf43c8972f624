import { Rail } from '../ui/rail.tsx'

/** What to say to the shop, so that nothing has to be explained twice. */
export function PhoneWords({ words }: { words: readonly string[] }) {
  return (
    <Rail title="To read out on the phone">
      {words.length === 0 ? (
        <p className="mt-2 text-small text-ink-2">Nothing answered yet. Say what you see, hear and smell.</p>
      ) : (
        <blockquote className="mt-2 border-l-[4px] border-ink pl-4 leading-[1.5]">
          “{words.join(' ')}”
        </blockquote>
      )}
    </Rail>
  )
}
