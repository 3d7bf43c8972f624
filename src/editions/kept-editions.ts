import * as z from 'zod/mini'
import { EditionInForce } from '../../server/editions/editions.contract.ts'
import type { FileName } from '../../server/editions/editions.contract.ts'
import { savesData } from '../offline/network.ts'
import { getSetting, setSetting } from '../offline/settings.ts'
import { bringFile, hashOf } from './edition-file.ts'

/** The editions whose files lie on this device. Earlier ones stay, because sheets begun with them do. */
const Kept = z.object({ inForce: EditionInForce, earlier: z.array(EditionInForce) })
type Kept = z.infer<typeof Kept>

/** What this device has, or undefined when it has nothing, or nothing that this build can read. */
export async function readKept(): Promise<Kept | undefined> {
  const kept = await getSetting('editionInForce').catch(() => undefined)
  return Kept.safeParse(kept).data
}

const forEveryone: readonly FileName[] = ['diagnosis', 'procedures-everyone', 'articles-everyone']
const forQualified: readonly FileName[] = ['procedures-qualified', 'articles-qualified']

/** Whoever saves data has what ranks, and of the rest what was opened. */
function wanted(qualified: boolean): readonly FileName[] {
  if (savesData()) return ['diagnosis']
  return qualified ? [...forEveryone, ...forQualified] : forEveryone
}

/**
 * Brings all that this device needs of an edition, then names it as the one to open with no network. In this order:
 * a name without its files would open nothing.
 */
export async function keepEdition(info: EditionInForce): Promise<void> {
  const qualified = (await getSetting('qualified')) !== undefined
  for (const name of wanted(qualified)) await bringFile(hashOf(info, name))
  const before = await readKept()
  const others = before === undefined ? [] : [before.inForce, ...before.earlier]
  const earlier = others.filter((one, index) => {
    const first = others.findIndex((other) => other.hash === one.hash)
    return one.hash !== info.hash && first === index
  })
  await setSetting('editionInForce', { inForce: info, earlier })
}
