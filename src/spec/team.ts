import type { Draft } from './draft.js';
import { present } from './present.js';
import { field } from './schema.js';
import type { MarginsSpec, WishesSpec } from './spec.js';
import { refuse } from './refuse.js';
import { readQuantity, readValue, valueFrom } from './value.js';
import { readChoices, readText, readTexts } from './words.js';

/** Everything under `wishes`. */
export function readWishes(draft: Draft): WishesSpec {
  return present({
    channels: readChannels(draft),
    package: readTexts(draft, 'wishes.package'),
    qualification: readText(draft, 'wishes.qualification'),
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
