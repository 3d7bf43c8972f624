/** Ends with 1 and names every fault when the environment is not one the server can start with. */
import { readConfig } from '../config.ts'

try {
  readConfig()
} catch (fault) {
  console.error(fault instanceof Error ? fault.message : String(fault))
  process.exitCode = 1
}
