import * as z from 'zod/mini'
import { EditionInForce } from '../../server/editions/editions.contract.ts'
import { savesData } from '../offline/network.ts'
import { getSetting, setSetting } from '../offline/settings.ts'
import { bringFile } from './edition-file.ts'

/** The editions whose files lie on this device. Earlier ones stay, because sheets begun with them do. */
const Kept = z.object({ inForce: EditionInForce, earlier: z.array(EditionInForce) })
type Kept = z.infer<typeof Kept>

/** What this device has, or undefined when it has nothing, or nothing that this build can read. */
export async function readKept(): Promise<Kept | undefined> {
  const kept = await getSetting('editionInForce').catch(() => undefined)
  return Kept.safeParse(kept).data
}

/** Whoever saves data has what ranks, and of the rest what was opened. */
const wanted = ({ files }: EditionInForce) =>
  savesData() ? files.filter((file) => file.name === 'diagnosis') : files

/** Brings what ranks with an earlier edition, and names it as one that lies here. */
export async function keepEarlier(info: EditionInForce): Promise<void> {
  for (const file of info.files.filter(({ name }) => name === 'diagnosis')) await bringFile(file)
  const before = await readKept()
  if (before === undefined || before.earlier.some(({ hash }) => hash === info.hash)) return
  await setSetting('editionInForce', { ...before, earlier: [...before.earlier, info] })
}

/**
 * Brings all that the server lets this person have of an edition, then names it as the one to open with no network. In
 * this order: a name without its files would open nothing.
 */
export async function keepEdition(info: EditionInForce): Promise<void> {
  for (const file of wanted(info)) await bringFile(file)
  const before = await readKept()
  const others = before === undefined ? [] : [before.inForce, ...before.earlier]
  const earlier = others.filter((one, index) => {
    const first = others.findIndex((other) => other.hash === one.hash)
    return one.hash !== info.hash && first === index
  })
  await setSetting('editionInForce', { inForce: info, earlier })
}
