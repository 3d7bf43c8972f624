import { useMemo, useState } from 'react'
import type { ReactNode } from 'react'
import type { EditionInForce } from '../../server/editions/editions.contract.ts'
import type { Edition } from '../../rules/edition/open.ts'
import { useArticles, useProcedures } from '../editions/edition.api.ts'
import { Button } from '../ui/button.tsx'
import { Dock } from '../ui/dock.tsx'
import { Failed } from '../ui/failed.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { Waiting } from '../ui/waiting.tsx'
import { AlsoFound } from './also-found.tsx'
import { Announcement } from './announcement.tsx'
import { BondPlate } from './bond-plate.tsx'
import { offersOf } from './choose-test.ts'
import { DeskProviders } from './desk-providers.tsx'
import { FieldStrip } from './field-strip.tsx'
import { LikelyCauses } from './likely-causes.tsx'
import { LoopSection } from './loop-section.tsx'
import { ModeWays } from './mode-ways.tsx'
import { MoreReadings } from './more-readings.tsx'
import { NextStep } from './next-step.tsx'
import { NumberPad } from './number-pad.tsx'
import { PlaceRun } from './place-run.tsx'
import { SeatsOfGround } from './seats.tsx'
import { SheetHead } from './sheet-head.tsx'
import type { HeadOpen } from './sheet-head.tsx'
import { undoes } from './sheet-state.ts'
import { StopPanel } from './stop-panel.tsx'
import { useDeskState } from './use-desk-state.ts'
import { useDiagnosis } from './use-diagnosis.ts'
import { useExpected } from './use-expected.ts'
import { useKeys, useLetterKeys } from './use-keys.ts'
import { useSelectedCause } from './use-selected-cause.ts'
import type { OpenSheet } from './use-sheet.ts'
import { WhatIfBar } from './what-if-bar.tsx'

const focusIn = (selector: string) => document.querySelector<HTMLElement>(selector)?.focus()

type SheetDeskProps = {
  sheet: OpenSheet
  edition: Edition
  info: EditionInForce
  /** What is to be known of the sheet as a whole, under its head. */
  lines: ReactNode
  /** Below what stops. */
  contradictions: ReactNode
}

/** The open sheet: readings at the left, what to do and what it may be at the right; on a phone one below the other. */
export function SheetDesk({ sheet, edition, info, lines, contradictions }: SheetDeskProps) {
  const { typed, stored, dispatch, unkept, keepAgain } = sheet
  const { diagnosis, before, stops, bond, errors, failed } = useDiagnosis(edition, stored)
  const desk = useDeskState(edition, sheet, errors)
  const selected = useSelectedCause(diagnosis)
  const expected = useExpected(stored, desk.meterOhms, selected.cause)
  const { tests } = useProcedures(true)
  const { articles } = useArticles(true)
  const [letters, setLetters] = useLetterKeys()
  const [head, setHead] = useState<HeadOpen>()
  const [finding, setFinding] = useState(false)
  const [picked, setPicked] = useState<string>()
  const offers = useMemo(
    () => offersOf(edition, stored, diagnosis?.nextTests ?? []),
    [edition, stored, diagnosis?.nextTests],
  )
  const undone = undoes(typed)
  const undo = () => dispatch({ do: 'undo' })
  const { place, places } = desk
  const seats = place?.seats
  const trying = typed.whatIf !== null
  const unread = Object.keys(errors).length > 0
  const byCause = useMemo(() => {
    const all = [...articles.values()]
    return (cause: string) =>
      all.find((article) => article.slug === cause) ?? all.find((article) => article.causes.includes(cause))
  }, [articles])

  const loadedTwin = () => {
    const groups = place?.groups ?? []
    const own = desk.chosen && edition.readings.get(`${desk.chosen.id}.loaded`)
    return own ?? groups.find((group) => group.id === 'loaded')?.readings[0]
  }
  const side = (pair: 'hn' | 'ng' | 'hg') => () => {
    if (seats) desk.go([seats[pair].id])
  }
  useKeys(letters, {
    s: () => setFinding(true),
    m: () => focusIn('#modes [role=radio][tabindex="0"]'),
    h: side('hn'),
    n: side('ng'),
    g: side('hg'),
    l: () => {
      const twin = loadedTwin()
      if (twin) desk.go([twin.id])
    },
    t: () => focusIn('.next-enter'),
    c: () => focusIn('[data-cause]'),
    undo,
    ...Object.fromEntries(places.map((one, index) => [String(index + 1), () => desk.lookAt(one.id)])),
  })

  const offer = offers.open.find((one) => one.key === picked) ?? offers.open[0]
  return (
    <DeskProviders desk={desk} selected={selected} expected={expected}>
      <Page title={`${typed.title}, Diagnosis`} width="none" className="desk">
        <SheetHead info={info} open={head} onOpen={setHead} letters={letters} onLetters={setLetters} />
        {unkept !== undefined && (
          <div className="desk-wide">
            <Failed title="Not kept on this device." onRetry={keepAgain}>
              {unkept}
            </Failed>
          </div>
        )}
        {lines}
        <div className="desk-left">
          <Rail
            title="Where ground sits"
            className="desk-ground"
            action={
              <span className="flex">
                {!trying && (
                  <Button look="plain" size="small" onPress={() => dispatch({ do: 'what-if' })}>
                    What if
                  </Button>
                )}
                <Button
                  look="plain"
                  size="small"
                  icon="undo"
                  onPress={undo}
                  {...(undone === undefined
                    ? { label: 'Undo: nothing to take back' }
                    : { label: `Undo: ${undone}` })}
                >
                  Undo
                </Button>
              </span>
            }
          >
            <ModeWays />
            <PlaceRun />
            <WhatIfBar />
            {seats && <SeatsOfGround seats={seats} />}
            <FieldStrip />
            {place && <MoreReadings key={place.id} place={place} />}
          </Rail>
          <AlsoFound finding={finding} onFinding={setFinding} />
        </div>
        <div className="desk-right">
          <StopPanel stops={stops} trying={trying} />
          {contradictions}
          {failed && (
            <Failed title="Couldn’t rank these findings.">What you typed stays. Load the page again.</Failed>
          )}
          {unread && (
            <p className="unread" role="status">
              {Object.keys(errors).length === 1 ? 'One entry' : `${Object.keys(errors).length} entries`} can’t
              be read and {Object.keys(errors).length === 1 ? 'is' : 'are'} left out of the ranking until
              mended.
            </p>
          )}
          {failed ? null : diagnosis === undefined ? (
            <Waiting what="the ranking" />
          ) : (
            <>
              <NextStep
                offers={offers}
                stopped={stops.length > 0}
                misfit={diagnosis.misfit !== undefined}
                procedure={(test) => tests.get(test)}
                picked={picked}
                onPick={setPicked}
              />
              {bond && <BondPlate bond={bond} trying={trying} unread={unread} />}
              <LikelyCauses diagnosis={diagnosis} before={before} articleOf={byCause} />
              <Announcement diagnosis={diagnosis} />
            </>
          )}
        </div>
        <LoopSection />
        <SignalPanel word="warning" slim className="desk-warning">
          Readings with a cover off and power on are for qualified people. Prove the meter on a known source,
          before and after. Local code and the authority having jurisdiction decide.
        </SignalPanel>
      </Page>
      {offer !== undefined && diagnosis !== undefined && !desk.typing && (
        <div className={`desk-dock ${stops.length > 0 ? 'desk-dock-still' : ''}`}>
          <Dock>
            <Button
              look={stops.length > 0 || diagnosis.misfit !== undefined ? 'outline' : 'main'}
              size="glove"
              wide
              iconAfter="next"
              onPress={() => desk.go(offer.next.findings, offer.mode)}
            >
              Next: {offer.test.label}
            </Button>
          </Dock>
        </div>
      )}
      <NumberPad />
    </DeskProviders>
  )
}
