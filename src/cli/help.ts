import type { CommandName } from './commands.ts'

const general = `Lagwright decides how thick the insulation on pipes and ducts has to be, and says why.

  lagwright size RUNS.csv|JOB.lagjob|- [options]              every run sized, as a table
  lagwright loss RUNS.csv|JOB.lagjob|- [options]              what every run loses in a year, bare and as built
  lagwright working RUNS.csv|JOB.lagjob|- --tag TAG [options] the whole calculation of one run, line by line

  --help            this text; after a command, that command's own
  --version         the version

The list has a header row and a row for every run: tag, shape, size (DN 50, NPS 2, CU 28) or od_mm, length_m,
medium_c or pressure_bar_g, air_c, and material, layers, conductivity_w_mk or thickness_mm. Separators are comma,
semicolon or tab. - reads it from standard input. See db/demo/harrowmere-creamery.csv for an example.

Exit codes
  0  done
  1  done, but a run cannot meet its limits
  2  something in the input is not right; nothing was written; every problem is on standard error, one a line
  3  Lagwright itself failed
`

const listOptions = `  --json            print one JSON object instead of the table
  --out FILE        write the result to FILE: .json, .csv or .txt
  --force           let --out replace a file that is there
  --units si|us     units of what is printed (default si; JSON and CSV are always SI)
  --job JOB.lagjob  take defaults from this job
`

const own: Readonly<Record<CommandName, string>> = {
  size: `  lagwright size RUNS.csv|JOB.lagjob|- [options]

Sizes every run of the list and prints a table. - reads a CSV from standard input.

${listOptions}
Exit codes: 0 done; 1 done, but a run cannot meet its limits; 2 bad input; 3 Lagwright itself failed.
The form of --json: npm run -s schema.
`,
  loss: `  lagwright loss RUNS.csv|JOB.lagjob|- [options]

Says what every run loses, bare and as built, now and in a year, and what they lose together. As built is the fixed
thickness; where none is given, the one that size chooses, marked "chosen"; where none meets the limits, the thickest.
Without hours_per_year the whole year is taken, 8760 h. Costs and CO2 stand where a fuel is known. Runs without a
length are listed and not in the total. Heat lost and heat gained are added apart.

${listOptions}
Exit codes: 0 done, whether or not limits are met (size judges them); 2 bad input; 3 Lagwright itself failed.
The form of --json: npm run -s schema -- loss.
`,
  working: `  lagwright working RUNS.csv|JOB.lagjob|- --tag TAG [options]

Prints the whole calculation of one run: every line in words, as a formula, with its numbers and its source, so that a
person with a pocket calculator can repeat it. SI units throughout.

  --tag TAG         the run
  --json            print the same as one JSON object
  --out FILE        write it to FILE: .txt or .json
  --force           let --out replace a file that is there
  --job JOB.lagjob  take defaults from this job

Exit codes: 0 done; 1 done, but the run cannot meet its limits; 2 bad input; 3 Lagwright itself failed.
The form of --json: npm run -s schema -- working.
`,
}

/** The text of a command; without one, of the program. */
export const helpOf = (command: CommandName | null): string =>
  command === null ? general : own[command]
