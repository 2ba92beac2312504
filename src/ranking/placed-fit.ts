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
  return new LazilyPlaced(fit, judgedAt);
}

/** A class: a sweep makes every part that fits one at each value, and an object with getters of its own is dear to make. */
class LazilyPlaced implements PlacedFit {
  readonly fit: SurveyedFit;
  readonly current: number | null;
  readonly proof: Placed['proof'];
  private readonly judgedAt: SurveyedCatalog['judgedAt'];
  private knownPart: PlacedFit['part'] | null = null;
  private knownVerdicts: readonly Digest[] | null = null;
  private knownMerit: Merit | null = null;

  constructor(fit: SurveyedFit, judgedAt: SurveyedCatalog['judgedAt']) {
    this.fit = fit;
    this.current = fit.current;
    this.proof = fit.isGuaranteed ? 'limits' : 'typical';
    this.judgedAt = judgedAt;
  }

  get part(): PlacedFit['part'] { return (this.knownPart ??= new SurveyedIdentity(this.fit)); }
  get verdicts(): readonly Digest[] { return (this.knownVerdicts ??= this.fit.digests.filter((digest) => digest !== null)); }
  get merit(): Merit { return (this.knownMerit ??= meritAt(this.fit.view, this.fit, priceInEuro(this))); }
  // With nothing but limits behind it there is nothing to confirm.
  get confirm(): Placed['confirm'] { return this.fit.isGuaranteed ? [] : this.judgedAt(this.fit).confirm; }
}

/** Who a surveyed part is, looked up when it is asked. */
class SurveyedIdentity implements Pick<Part, 'id' | 'tier' | 'price' | 'family'> {
  private readonly fit: SurveyedFit;

  constructor(fit: SurveyedFit) {
    this.fit = fit;
  }

  get id(): string { return this.fit.view.id(this.fit.position); }
  get tier(): Part['tier'] { return this.fit.view.tier; }
  get price(): Part['price'] { return piece(this.fit.view, 'price', this.fit.price).price; }
  get family(): Part['family'] { return piece(this.fit.view, 'family', this.fit.family).family; }
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
