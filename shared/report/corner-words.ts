import { type CriterionId, PRE } from '../checks/criteria.ts';
import type { Corner } from '../checks/evaluation.ts';

/** How each end of a corner's variable is said: first end, second end. */
const WORDS: Record<string, Record<string, string>> = {
  supply: { min: 'supply low', max: 'supply high' },
  ambient: { min: 'cold', max: 'hot' },
  drive: { weak: 'weak pin', strong: 'strong pin' },
  rb: { '-': 'RB low', '+': 'RB high' },
  rbe: { '-': 'RBE low', '+': 'RBE high' },
  load: { '-': 'load R low', '+': 'load R high' },
  gain: { min: 'gain low', max: 'gain high' },
  vbe: { min: 'VBE low', max: 'VBE high' },
  vceSat: { '0': 'VCE zero', max: 'VCE(sat) high' },
  instant: { start: 'at start', settled: 'settled' },
  veb: { min: 'VEB low', max: 'VEB high' },
  vf: { min: 'VF low', max: 'VF high' },
  r1: { '-': 'R1 low', '+': 'R1 high' },
  ratio: { '-': 'R2/R1 low', '+': 'R2/R1 high' },
};

/** Variables worth naming for a criterion, those that decide it first. */
const NAMED: Partial<Record<CriterionId, readonly string[]>> = {
  'overdrive-factor': ['supply', 'ambient', 'drive', 'rb'],
  'forced-beta': ['supply', 'ambient', 'drive', 'rb'],
  'load-voltage': ['supply', 'ambient', 'instant'],
  'saturation-voltage': ['supply', 'ambient', 'instant'],
  'drive-current': ['drive', 'ambient', 'rb'],
  'base-current': ['drive', 'ambient', 'rb'],
  'collector-current': ['supply', 'ambient', 'load'],
  'peak-current': ['supply', 'ambient', 'load'],
  'junction-temperature': ['supply', 'ambient', 'instant'],
  dissipation: ['supply', 'ambient', 'drive', 'instant'],
  'load-overvoltage': ['supply', 'ambient'],
  'input-on': ['supply', 'ambient', 'drive', 'rb'],
  'input-voltage': ['drive', 'rb'],
  'input-off': ['supply'],
  'load-current': ['supply', 'ambient', 'load', 'vf'],
  'load-current-low': ['supply', 'ambient', 'load', 'vf'],
  'inrush-saturation': ['ambient', 'drive', 'rb'],
  'output-low': ['supply', 'ambient', 'load'],
  'output-high': ['ambient', 'rb', 'rbe'],
  'rc-dissipation': ['supply', 'ambient'],
  'rb-dissipation': ['drive', 'ambient', 'rb'],
  'rbe-dissipation': ['ambient', 'rbe', 'vbe'],
  'pull-up-dissipation': ['supply', 'ambient'],
  'off-base-voltage': ['ambient', 'rb', 'rbe'],
  'off-collector-current': ['ambient', 'rb', 'rbe'],
  'off-collector-voltage': ['supply'],
  'reset-off': ['ambient', 'rbe'],
  'reset-off-current': ['ambient', 'rbe'],
  'reverse-base-voltage': ['supply', 'rbe'],
  'drive-maximum': ['supply'],
  'peak-collector-voltage': ['supply'],
  'release-time': ['supply', 'ambient', 'load'],
  'clamp-current': ['supply', 'ambient', 'load'],
  'clamp-power': ['supply', 'ambient', 'load'],
  'storage-time': ['drive', 'ambient', 'rb', 'instant'],
  'low-to-high-delay': ['supply', 'ambient', 'drive', 'rb'],
};

/** Off-state criteria are judged on a junction that is still hot from being on. */
const JUST_SWITCHED_OFF: readonly string[] = [
  'off-base-voltage',
  'off-collector-current',
  'output-high',
  'reset-off',
  'reset-off-current',
];

/**
 * The worst corner of a criterion in a few words, such as `supply high, cold, weak pin, RB high`.
 *
 * @param corner the ends it stands at; ends the criterion does not depend on are left out
 */
export function cornerWords(corner: Corner, criterionId: string): string {
  const own = criterionId.startsWith(PRE) ? criterionId.slice(PRE.length) : criterionId;
  const named = NAMED[own as CriterionId] ?? Object.keys(WORDS);
  const words = named
    .map((variable) => WORDS[variable]?.[corner[variable] ?? ''])
    .filter((word) => word !== undefined);
  if (JUST_SWITCHED_OFF.includes(own)) words.push('just switched off');
  return words.join(', ');
}
