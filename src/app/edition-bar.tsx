import { useNewEdition } from '../editions/edition.api.ts'
import { Button } from '../ui/button.tsx'

/** Offers an edition that was put in force while this page was open. Nothing changes until the button is pressed. */
export function EditionBar() {
  const { announced, current, load } = useNewEdition()
  if (announced === undefined) return null
  return (
    <div className="px-4 tablet:px-5" role="status">
      <div className="edition-bar">
        <p className="mr-auto">
          <b>Edition {announced} is in force.</b> {current !== undefined && `Your sheet stays on ${current}.`}
        </p>
        <Button size="small" onPress={() => load()}>
          Load edition {announced}
        </Button>
      </div>
    </div>
  )
}
