/**
 * Imported first by every module that makes zod schemas: zod decides at their making whether it may make code from text,
 * which the page's content security policy forbids and reports even where it is only tried.
 */
import { config } from 'zod'

config({ jitless: true })
