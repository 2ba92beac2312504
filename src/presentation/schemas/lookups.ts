import * as z from 'zod';
import { asking, data } from './answer.js';
import { envelope } from './envelope.js';
import { confirmation, groupCounts, tier } from './judged-part.js';
import { count, unit } from './measures.js';
import { stage } from './stage.js';
import { limitKind } from './verdict.js';

const rank = z.int().min(1);

const lookup = z
  .strictObject({
    figure: z.string().describe('Parameter, or an identity field'),
    kind: limitKind.nullable(),
    unit: unit.nullable(),
    header: z.string().describe('Header of its column in canonical CSV'),
    checks: z.array(z.string()).describe('Open checks it decides, or helps to'),
    decidesAt: z
      .strictObject({ value: z.number(), side: z.enum(['less', 'more']).describe('The side that passes'), until: z.number().nullable().describe('Other end, where only a window passes') })
      .nullable()
      .describe('Where the verdict turns, the other figures of the part at good values; null when any sensible value decides it'),
    wanted: z.union([z.string(), z.number()]).nullable().describe('Identity fields: what the stage wants there'),
    span: z
      .strictObject({ least: z.number(), most: z.number(), parts: count('Parts that have it'), class: z.string().nullable() })
      .nullable()
      .describe('Least and most of it in the catalog, for scale: in the class where one is named'),
    cell: z
      .strictObject({ file: z.string(), row: z.int(), column: z.int(), letter: z.string(), header: z.string(), text: z.string().describe('As written'), at: z.string().describe('RFC 7111') })
      .nullable()
      .describe('Where it belongs; null when the list has no column for it'),
    text: z.string(),
  })
  .meta({ id: 'lookup', title: 'A figure to look up' });

/** What would decide one part. */
export const partLookups = z
  .strictObject({
    part: z.string().describe('Id of the part'),
    tier,
    status: z.string().nullable(),
    likely: z.boolean().describe('With the worst figures of its class it would pass'),
    settles: z.boolean().describe('Good answers to all look-ups make it fit, but for what remains'),
    remains: z.array(z.string()).describe('Checks that stay open whatever is looked up'),
    place: z
      .strictObject({ rank, of: rank, best: rank.describe('With the best figures of its class') })
      .nullable()
      .describe('Where it would stand with figures just good enough, or at the worst of its class where that is good enough'),
    row: z.strictObject({ file: z.string(), row: z.int() }).nullable().describe("Its row in the team's list"),
    lookups: z.array(lookup),
    assume: z.array(z.string()).nullable().describe('PART.figure=VALUE to give to --assume: together they decide it in one run'),
  })
  .meta({ id: 'partLookups', title: 'What would decide a part' });

/** `railfit shortlist --lookups --json` */
export const lookups = envelope('lookups', 'What to look up so that undecided parts are decided, most worth first', {
  stage,
  counts: groupCounts,
  settled: z.strictObject({ parts: count('Undecided parts that are settled'), figures: count('Figures to look up'), datasheets: count('Datasheets to open') }),
  firstRank: rank.nullable().describe('Best rank the first could take; null when nothing is settled'),
  datasheets: z.array(z.strictObject({ name: z.string().describe('Family, or id of the part'), figures: count('Different figures in it'), parts: z.array(partLookups) })),
  unsettled: z.array(partLookups).describe('Undecided parts of the list that look-ups alone do not settle'),
  generic: count('Undecided generic sets: classes, with no datasheet'),
  confirm: z.array(z.strictObject({ part: z.string(), rank, confirm: z.array(confirmation) })).describe('Apart from these: parts that fit on figures to confirm before release'),
  written: z.string().nullable().describe('The sheet that was made'),
  asking,
  data,
});
