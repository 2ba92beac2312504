import type { Part } from '../parts/part.js';
import type { ScreenView } from '../parts/screen-view.js';
import type { Trait } from '../parts/traits.js';
import type { Digest, SurveyedCatalog, SurveyedFit } from '../screening/index.js';
import { comfortOf } from './comfort.js';
import { marginsFrom, meritFrom, type Merit, priceInEuro } from './merit.js';
import type { Placed } from './placed.js';

/** A part that was surveyed, with what its place depends on: each made when it is first looked at. */
export interface PlacedFit extends Placed {
  readonly fit: SurveyedFit;
  readonly merit: Merit;
}

export function placedFit(fit: SurveyedFit, judgedAt: SurveyedCatalog['judgedAt']): PlacedFit {
  const { view, current } = fit;
  let [verdicts, merit]: [readonly Digest[] | null, Merit | null] = [null, null];
  const part = partOf(fit);
  return {
    fit, current, part,
    get verdicts() { return (verdicts ??= fit.digests.filter((digest) => digest !== null)); },
    proof: fit.isGuaranteed ? 'limits' : 'typical',
    get merit() { return (merit ??= meritAt(view, fit, priceInEuro({ part }))); },
    // With nothing but limits behind it there is nothing to confirm.
    get confirm() { return fit.isGuaranteed ? [] : judgedAt(fit).confirm; },
  };
}

function partOf({ view, position, price, family }: SurveyedFit): PlacedFit['part'] {
  return {
    tier: view.tier,
    price: piece(view, 'price', price).price,
    family: piece(view, 'family', family).family,
    get id() { return view.id(position); },
  };
}

function piece<Name extends 'price' | 'family'>(view: ScreenView, trait: Name & Trait, code: number): Pick<Part, Name> {
  return view.piece(trait, code) as Pick<Part, Name>;
}

/** The merit of a part as it was last asked, and what it was made of. */
interface KeptMerit {
  readonly digests: (Digest | null)[];
  readonly comforts: (number | null)[];
  readonly price: number | null;
  readonly current: number | null;
  readonly merit: Merit;
}

const KEPT = new WeakMap<ScreenView, Map<number, KeptMerit>>();

/** A changed limit changes one digest of a part, and most of the time not how comfortable it is: then the merit is what it was. */
function meritAt(view: ScreenView, { position, digests, current }: SurveyedFit, price: number | null): Merit {
  const ofView = KEPT.get(view) ?? new Map<number, KeptMerit>();
  KEPT.set(view, ofView);
  const known = ofView.get(position);
  if (known?.price === price && known.current === current && isAsComfortable(known, digests)) return known.merit;
  const comforts = digests.map((digest) => (digest === null ? null : comfortOf(digest)));
  const merit = meritFrom({ margins: marginsFrom(comforts), price, current });
  ofView.set(position, { digests: [...digests], comforts, price, current, merit });
  return merit;
}

/** Takes note of digests that are new and no more or less comfortable. */
function isAsComfortable({ digests, comforts }: KeptMerit, now: SurveyedFit['digests']): boolean {
  if (digests.length !== now.length) return false;
  for (let at = 0; at < now.length; at += 1) {
    const digest = now[at] ?? null;
    if (digest === digests[at]) continue;
    if (comforts[at] !== (digest === null ? null : comfortOf(digest))) return false;
    digests[at] = digest;
  }
  return true;
}
