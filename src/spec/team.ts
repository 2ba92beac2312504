import type { Draft } from './draft.js';
import { present } from './present.js';
import { field } from './schema.js';
import type { MarginsSpec, WishesSpec } from './spec.js';
import { refuse } from './refuse.js';
import { readQuantity, readValue, valueFrom } from './value.js';
import { QUALIFICATIONS } from './team-fields.js';
import { fold } from './nearest.js';
import { readChoices, readText, readTexts, unknownWord } from './words.js';

/** Everything under `wishes`. */
export function readWishes(draft: Draft): WishesSpec {
  return present({
    channels: readChannels(draft),
    package: readTexts(draft, 'wishes.package'),
    qualification: readQualification(draft),
    status: readChoices(draft, 'wishes.status'),
    lifecycle: readChoices(draft, 'wishes.lifecycle'),
    price: readPrice(draft),
  });
}

/** Everything under `margins`: two factors and a voltage. */
export function readMargins(draft: Draft): MarginsSpec {
  return present({
    slewRate: readValue(draft, 'margins.slewRate')?.value,
    gainBandwidth: readValue(draft, 'margins.gainBandwidth')?.value,
    outputHeadroom: readValue(draft, 'margins.outputHeadroom'),
  });
}

/** A grade as it is spelled in the standard; `none` asks for none. */
function readQualification(draft: Draft): string | undefined {
  const text = readText(draft, 'wishes.qualification');
  if (text === undefined || text.toLowerCase() === 'none') return undefined;
  const grade = QUALIFICATIONS.find((one) => fold(one) === fold(text));
  return grade ?? refuse(draft, 'wishes.qualification', unknownWord(text, 'wishes.qualification'));
}

function readChannels(draft: Draft): number | undefined {
  const channels = readValue(draft, 'wishes.channels');
  if (channels === undefined || Number.isInteger(channels.value)) return channels?.value;
  return refuse(draft, 'wishes.channels', { code: 'S110', message: `${channels.text} amplifiers: accepted: ${field('wishes.channels').accepted}`, fix: field('wishes.channels').example });
}

function readPrice(draft: Draft): WishesSpec['price'] | undefined {
  const quantity = readQuantity(draft, 'wishes.price');
  if (quantity === undefined) return undefined;
  const read = valueFrom(draft, 'wishes.price', quantity);
  return read === undefined ? undefined : { amount: read.value, currency: quantity.unit, text: read.text };
}
