import { formatNumber, formatPercent, formatQuantity } from '../units/engineering-notation.ts';
import type { BomLine, BomNote, BomRevision } from './bom-note.ts';

/** Shown where there is nothing to show. */
export const NOTHING = '–';

const asChosen = { digits: 12 };
const SPACE = '\u00a0';

/** `4.7 kΩ`, `22.8…25.6 V`, `–` */
export function valueText({ value }: Pick<BomLine, 'value'>): string {
  if (value === null) return NOTHING;
  const last = formatQuantity(value.max, value.unit, asChosen);
  if (value.min === value.max) return last;
  const first = formatQuantity(value.min, value.unit, asChosen);
  const unit = (text: string) => text.slice(text.indexOf(SPACE));
  return `${unit(first) === unit(last) ? first.replace(unit(first), '') : first}…${last}`;
}

/** `±5 %, 0.1 W`, `±10 %, 20 °C`, `–` */
export function ratingText({ tolerance, ratings }: Pick<BomLine, 'tolerance' | 'ratings'>): string {
  const parts = [
    ...(tolerance === null ? [] : [`±${formatPercent(tolerance, asChosen)}`]),
    ...ratings.map(rating),
  ];
  return parts.length === 0 ? NOTHING : parts.join(', ');
}

/** Ratings are spoken of in watts and amperes: 0.1 W, not 100 mW. */
function rating({ value, unit }: BomLine['ratings'][number]): string {
  const plain = (unit === 'W' || unit === 'A') && value >= 0.01;
  return plain
    ? `${formatNumber(value, asChosen)}${SPACE}${unit}`
    : formatQuantity(value, unit, asChosen);
}

/** Unverified data is labelled wherever it is shown. */
export function descriptionText({
  description,
  unverified,
}: Pick<BomLine, 'description' | 'unverified'>): string {
  return unverified ? `${description}; data unverified` : description;
}

/** The first twelve digits of a hash, in fours. */
export function shortHash(hash: string): string {
  return (hash.slice(0, 12).match(/.{4}/g) ?? []).join(' ');
}

/** `2026-03-10`, `not signed` */
export function signedText({ signedAtMs }: Pick<BomRevision, 'signedAtMs'>): string {
  return signedAtMs === null ? 'not signed' : utcDate(signedAtMs);
}

/** `7, all locked`, `8, of these 6 locked` */
export function stagesText({ counts }: BomNote): string {
  const { stages, locked } = counts;
  if (stages === 0) return 'none';
  return locked === stages ? `${stages}, all locked` : `${stages}, of these ${locked} locked`;
}

/** Label and value of the part data's standing. */
export function dataText({ counts }: BomNote): { label: string; value: string } {
  const { partsChanged, partsUnverified } = counts;
  const label = partsUnverified === 0 ? 'Data, all verified' : 'Data';
  if (partsUnverified === 0) {
    const changed = `${countOf(partsChanged, 'part')} changed since lock`;
    return { label, value: partsChanged === 0 ? 'unchanged since lock' : changed };
  }
  const value =
    partsChanged === 0
      ? `${countOf(partsUnverified, 'line')} unverified`
      : `${partsUnverified} unverified, ${partsChanged} changed`;
  return { label, value };
}

const countOf = (count: number, word: string) => `${count} ${word}${count === 1 ? '' : 's'}`;

/** `Issued 2026-03-10, 14:52 Z`, `Preview, 2026-03-10 14:52 Z` */
export function occasionText({ issue, atMs }: BomNote): string {
  const [date, time] = [utcDate(atMs), utcTime(atMs)];
  return issue === null ? `Preview, ${date} ${time} Z` : `Issued ${date}, ${time} Z`;
}

/** Document status of ISO 7200. */
export function statusText({ issue, released }: BomNote): string {
  if (!released) return 'Not released';
  return issue === null ? 'Preview, not issued' : 'Released';
}

/** `2026-03-10`, of ms since 1970, UTC. */
export function utcDate(atMs: number): string {
  return isoTime(atMs).slice(0, 10);
}

/** `14:52`, of ms since 1970, UTC. */
export function utcTime(atMs: number): string {
  return isoTime(atMs).slice(11, 16);
}

// eslint-disable-next-line no-restricted-globals -- formats the time it is given; reads no clock
const isoTime = (atMs: number) => new Date(atMs).toISOString();
