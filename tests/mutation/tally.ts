/** What became of the mutants of one folder, in numbers and in words. */

/** Share of the mutants that the tests have to notice [%]. */
export const LEAST_SCORE_PERCENT = 85

/** The part of a mutant's result that is told. */
export interface Mutant {
  readonly status: string
  readonly fileName: string
  readonly location: { readonly start: { readonly line: number; readonly column: number } }
  readonly mutatorName: string
  readonly replacement?: string | undefined
}

export interface Tally {
  readonly killed: number
  readonly timedOut: number
  readonly survived: number
  readonly notCovered: number
  /** Mutants that do not even load, and so say nothing of the tests. */
  readonly invalid: number
  /** Noticed of all valid ones [%]; null where there are none. */
  readonly scorePercent: number | null
}

export function tallyOf(mutants: readonly Mutant[]): Tally {
  const count = (...statuses: readonly string[]) =>
    mutants.filter(({ status }) => statuses.includes(status)).length
  const [killed, timedOut] = [count('Killed'), count('Timeout')]
  const [survived, notCovered] = [count('Survived'), count('NoCoverage')]
  const valid = killed + timedOut + survived + notCovered
  return {
    killed,
    timedOut,
    survived,
    notCovered,
    invalid: mutants.length - valid,
    scorePercent: valid > 0 ? (100 * (killed + timedOut)) / valid : null,
  }
}

export const isEnough = ({ scorePercent }: Tally): boolean =>
  scorePercent !== null && scorePercent >= LEAST_SCORE_PERCENT

/** Never rounds up to a score that is not reached. */
const percent = (value: number): string => `${(Math.floor(value * 10) / 10).toFixed(1)} %`

export function tallyLine(folder: string, tally: Tally): string {
  const { killed, timedOut, survived, notCovered, invalid, scorePercent } = tally
  const parts = [
    `${killed} killed`,
    `${timedOut} timed out`,
    `${survived} survived`,
    `${notCovered} not covered`,
    ...(invalid > 0 ? [`${invalid} invalid`] : []),
  ]
  const score = scorePercent === null ? 'no mutants' : percent(scorePercent)
  const verdict = isEnough(tally) ? '' : `, BELOW ${LEAST_SCORE_PERCENT} %`
  return `${folder.padEnd(18)} ${parts.join(', ')}: ${score}${verdict}`
}

export const isSurvivor = ({ status }: Mutant): boolean =>
  status === 'Survived' || status === 'NoCoverage'

/** The mutants that no test noticed, in the order of the source, each with what stood there instead. */
export function survivorsText(mutants: readonly Mutant[]): string {
  return mutants
    .filter(isSurvivor)
    .toSorted(
      (a, b) =>
        a.fileName.localeCompare(b.fileName, 'en') ||
        a.location.start.line - b.location.start.line ||
        a.location.start.column - b.location.start.column,
    )
    .map(({ status, fileName, location, mutatorName, replacement }) => {
      const { line, column } = location.start
      const kind = status === 'NoCoverage' ? 'not covered' : 'survived'
      return `${fileName}:${line}:${column} ${kind} ${mutatorName}: ${inOneLine(replacement ?? '')}\n`
    })
    .join('')
}

const inOneLine = (code: string): string => code.replaceAll(/\s+/g, ' ')
