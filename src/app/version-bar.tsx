import { useEffect } from 'react'
import { useLocation } from 'react-router-dom'
import { holdSheet } from '../offline/sheet-lock.ts'
import { loadNewerPages, useNewerPages } from '../offline/worker.ts'
import { Button } from '../ui/button.tsx'

const sheetPages = /^\/(check|diagnosis)\b/
/** Nothing stands above what to do in danger. */
const quietPages = /^\/check\b/

/** Offers newer pages that this device has brought. They wait for the button, or until no sheet is open anywhere. */
export default function VersionBar() {
  const { pathname } = useLocation()
  const newer = useNewerPages()
  const onSheet = sheetPages.test(pathname)
  useEffect(() => (onSheet ? holdSheet() : undefined), [onSheet])
  if (!newer || quietPages.test(pathname)) return null
  return (
    <div className="px-4 tablet:px-5" role="status">
      <div className="edition-bar">
        <p className="mr-auto">
          <b>A newer version of these pages is here.</b> What is kept on this device stays.
        </p>
        <Button size="small" onPress={loadNewerPages}>
          Load it
        </Button>
      </div>
    </div>
  )
}
