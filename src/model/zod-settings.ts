/**
 * zod compiles parsers with `new Function`, and even asking whether it may is refused by the page's content security
 * policy. Imported first wherever a schema of the window is made, since the question is asked when one is made.
 */
import { z } from 'zod'

z.config({ jitless: true })
