/** What a check must hold before it can pass. Structural, so that `review` imports nothing. */
export interface CheckUnderWay {
  readonly overdriveFactor: number | null;
  readonly method: string | null;
  readonly note: string;
  readonly reason: string;
  readonly justifications: Readonly<Record<string, string>>;
  readonly read: readonly string[];
}

export interface JudgedCriterion {
  readonly id: string;
  readonly value: number | null;
  readonly status: string;
}

/** The stored result the check is about. */
export interface JudgedStage {
  readonly verdict: string;
  readonly criteria: readonly JudgedCriterion[];
}

export interface NumberedFinding {
  readonly number: number;
  readonly state: string;
}

/**
 * How far the checker's overdrive factor lies from the tool's.
 *
 * @returns (checker's − tool's)/tool's, signed; null until both exist
 */
export function figureDifference(
  check: Pick<CheckUnderWay, 'overdriveFactor'> | null,
  criteria: readonly JudgedCriterion[],
): number | null {
  const tool = toolFigure(criteria);
  const own = check?.overdriveFactor ?? null;
  return tool === null || tool === 0 || own === null ? null : (own - tool) / tool;
}

/**
 * What is still missing before a check can pass.
 *
 * @param reasonAbove difference above which a reason is asked, as a fraction
 * @returns sentences for the checker; empty when nothing is missing
 */
export function missingForPass(
  check: CheckUnderWay | null,
  { verdict, criteria }: JudgedStage,
  findings: readonly NumberedFinding[],
  reasonAbove: number,
): string[] {
  const unexplained =
    (verdict === 'fail' || verdict === 'open') &&
    !criteria.some((criterion) => criterion.status === verdict);
  const read = new Set(check?.read);
  const unread = criteria.filter((criterion) => !read.has(criterion.id)).length;
  return [
    ...(unexplained ? [`The verdict is ${verdict} for the whole stage: return the revision.`] : []),
    ...missingFigure(check, criteria, reasonAbove),
    ...criteria.flatMap((criterion) => missingJustification(criterion, check)),
    ...(unread === 0
      ? []
      : [`Read all ${criteria.length} criteria; ${criteria.length - unread} are read so far.`]),
    ...findings
      .filter((finding) => finding.state !== 'closed')
      .map((finding) => `Close finding ${finding.number}.`),
  ];
}

function missingFigure(
  check: CheckUnderWay | null,
  criteria: readonly JudgedCriterion[],
  reasonAbove: number,
): string[] {
  const missing: string[] = [];
  if (toolFigure(criteria) !== null && (check?.overdriveFactor ?? null) === null) {
    missing.push('Enter an overdrive factor of your own.');
  }
  if ((check?.method ?? null) === null)
    missing.push('Say how it was found: by hand or on the bench.');
  if ((check?.note ?? '') === '') missing.push('Note how the figure was got.');
  const difference = figureDifference(check, criteria);
  if (difference !== null && Math.abs(difference) > reasonAbove && check?.reason === '') {
    missing.push(`Give a reason for the difference of ${(difference * 100).toFixed(1)} %.`);
  }
  return missing;
}

function missingJustification(criterion: JudgedCriterion, check: CheckUnderWay | null): string[] {
  const words = criterion.id.replaceAll('-', ' ');
  if (criterion.status === 'fail') return [`The criterion ${words} fails: return the revision.`];
  if (criterion.status !== 'marginal' && criterion.status !== 'open') return [];
  const text = check?.justifications[criterion.id] ?? '';
  return text === '' ? [`Justify ${words}, which is ${criterion.status}.`] : [];
}

function toolFigure(criteria: readonly JudgedCriterion[]): number | null {
  return criteria.find((criterion) => criterion.id === 'overdrive-factor')?.value ?? null;
}
