import { z } from 'zod';
import { isCountry } from '../units/countries.ts';

export const uuid = z.uuid({ error: 'This is not an identifier' });

/** A calendar day, ISO 8601 `YYYY-MM-DD`; agreed dates are days and not instants. */
export const isoDay = z.iso
  .date({ error: 'Give a date as year-month-day' })
  // Beyond these a year is a slip of the key, and a plan over thousands of years is none.
  .refine((day) => day >= '1990-01-01' && day <= '2100-12-31', 'Give a day between 1990 and 2100');

/** An instant in UTC, ISO 8601. */
export const instant = z.iso.datetime();

/** Counts saves of one record; a save names the revision it started from. */
export const revision = z.int().min(1);

/** A measured or estimated figure; its unit is in the name of the field. */
export const figure = z.number({ error: 'Write a number such as 12 or 12.5' });

/** An amount in the minor unit of its currency. */
export const amountMinor = z.int({ error: 'Write an amount such as 1250 or 1250.50' }).min(0, 'Give 0 or more');

/** One line of typed text, trimmed. */
export const line = (maxLength: number) =>
  z
    .string()
    .trim()
    .min(1, 'Write something here')
    .max(maxLength, `Keep this to ${maxLength} characters`)
    .refine((text) => !/[\r\n]/.test(text), 'Keep this to one line');

/** Several lines of typed text, trimmed, not empty. */
export const prose = (maxLength: number) =>
  z.string().trim().min(1, 'Write something here').max(maxLength, `Keep this to ${maxLength} characters`);

/** Several lines that may stay empty. */
export const optionalProse = (maxLength: number) =>
  z.string().trim().max(maxLength, `Keep this to ${maxLength} characters`);

export const emailAddress = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'Keep this to 254 characters')
  .pipe(z.email({ error: 'Give an e-mail address' }));

/** IANA time zone name. */
export const timeZone = z
  .string()
  .max(60)
  .refine((name) => {
    try {
      new Intl.DateTimeFormat('en', { timeZone: name });
      return true;
    } catch {
      return false;
    }
  }, 'This is not a time zone name such as Europe/Berlin');

/** ISO 3166-1 alpha-2. */
export const country = z.string().refine(isCountry, 'Choose a country (two-letter code, ISO 3166-1)');

export const inCommission = z.object({ commissionId: uuid });

/** One page of a list; `nextCursor` is opaque and absent on the last page. */
export const page = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });

export const pageQuery = z.object({
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
});
