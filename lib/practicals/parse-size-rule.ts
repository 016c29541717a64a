import type { Band, SizeRule } from '@/lib/scoring';
import type { DraftSide, DraftSizeRule } from './draft';
import { FieldReader } from './field-reader';

/** A price of error from its typed fields, with a message at each field that no rubric could use. */
export function parseSizeRule(reader: FieldReader, path: string, rule: DraftSizeRule): SizeRule {
  const over = parseSide(reader, `${path}.over`, rule.over);
  const under = parseSide(reader, `${path}.under`, rule.under);
  const cap = reader.optional(rule.cap, () => reader.points(`${path}.cap`, rule.cap));
  return {
    over: over.bands,
    under: under.bands,
    beyondOver: over.beyond,
    beyondUnder: under.beyond,
    cap,
  };
}

/** The same for a drawing that follows the typing: null while any field cannot be used. */
export function readSizeRule(rule: DraftSizeRule, unit: 'in' | 'mm'): SizeRule | null {
  const reader = new FieldReader(unit);
  const read = parseSizeRule(reader, 'rule', rule);
  return Object.keys(reader.errors).length === 0 ? read : null;
}

function parseSide(reader: FieldReader, path: string, side: DraftSide) {
  const bands: Band[] = [];
  side.bands.forEach((typed, index) => {
    const at = `${path}.bands.${index}`;
    const band = {
      within: reader.distance(`${at}.within`, typed.within),
      lose: index === 0 ? 0 : reader.points(`${at}.lose`, typed.lose),
    };
    const before = bands.at(-1);
    if (before && !reader.hasErrorAt(`${at}.within`) && band.within <= before.within) {
      reader.refuse(`${at}.within`, 'Each band reaches further than the one before it.');
    }
    if (before && !reader.hasErrorAt(`${at}.lose`) && band.lose < before.lose) {
      reader.refuse(`${at}.lose`, 'A band takes no less than the one before it.');
    }
    bands.push(band);
  });
  const beyond = reader.points(`${path}.beyond`, side.beyond);
  if (!reader.hasErrorAt(`${path}.beyond`) && beyond < (bands.at(-1)?.lose ?? 0)) {
    reader.refuse(`${path}.beyond`, 'Past the last band a size loses no less than in it.');
  }
  return { bands, beyond };
}
