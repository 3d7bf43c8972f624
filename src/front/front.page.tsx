import { useState } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { usePagesKept } from '../offline/pages-kept.ts'
import { LinkButton } from '../ui/button.tsx'
import { Page } from '../ui/page.tsx'
import { Rail } from '../ui/rail.tsx'
import { SearchBox } from '../ui/search-box.tsx'
import { shop } from '../ui/shop.ts'
import { SignalPanel } from '../ui/signal-panel.tsx'
import { EditionLine } from './edition-line.tsx'
import { EmptyRail } from './empty-rail.tsx'
import { Starts } from './starts.tsx'
import './front.css'

/** Searches that people come with, as links. */
const lookUps = ['tingle from metal', 'breaker trips at once', 'lights bright and dim'] as const

function LookUp() {
  const [text, setText] = useState('')
  const navigate = useNavigate()
  const query = text.trim()
  return (
    <Rail title="Look something up">
      <div className="mt-[10px]">
        <SearchBox
          label="Search articles"
          placeholder="breaker trips at once, 60 V to ground …"
          value={text}
          onText={setText}
          onSubmit={() =>
            void navigate(query === '' ? '/articles' : `/articles?q=${encodeURIComponent(query)}`)
          }
        />
      </div>
      <ul>
        {lookUps.map((words) => (
          <li key={words} className="border-b border-rule">
            <Link className="front-link" to={`/articles?q=${encodeURIComponent(words)}`}>
              {words}
            </Link>
          </li>
        ))}
        <li>
          <Link className="front-link" to="/articles">
            All articles
          </Link>
        </li>
      </ul>
    </Rail>
  )
}

function WhatThisIs() {
  return (
    <Rail title="What this is">
      <p className="mb-[14px] mt-1 text-small text-ink-2">
        {shop.name} keeps these pages for the people whose inverters, power stations, generators and panels it
        looks after. You need no account. What you answer stays on this device; at the end you get words to
        read out on the phone.
      </p>
      <SignalPanel word="warning" slim>
        <b>Leave every cover on.</b> Parts behind the cover of an outlet (receptacle), switch or panel can
        kill. They are for qualified people.
      </SignalPanel>
      <p className="mt-[14px] text-small text-ink-2">
        A guide, not an inspection. Local code and the authority having jurisdiction (your local inspector)
        decide.
      </p>
    </Rail>
  )
}

/** The front page: danger first (the bar above), then one thing to do, then what to start with. */
export function Component() {
  const pagesKept = usePagesKept()
  return (
    <div className="front">
      <Page title="Something is wrong with the power" width="none">
        <section className="front-hero">
          <EmptyRail />
          <h1>
            Something is wrong <br />
            with the power.
          </h1>
          <p className="front-lead">
            Is it dangerous? Can you deal with it? <br />
            Or is it work for a professional? <br />
            Five minutes, nothing opened.
          </p>
          <LinkButton to="/check/1" look="main" size="glove" iconAfter="next" className="front-start">
            Check my power
          </LinkButton>
        </section>
        <Starts />
        <div className="front-two">
          <LookUp />
          <WhatThisIs />
        </div>
      </Page>
      <footer className="front-foot">
        <div>
          <EditionLine />
          {pagesKept && <span>Works with no network once opened</span>}
          <Link to="/diagnosis" className="link-alone">
            For qualified people: Diagnosis
          </Link>
        </div>
      </footer>
    </div>
  )
}
