export const help = `Lagwright decides how thick the insulation on pipes and ducts has to be, and says why.

  lagwright size RUNS.csv|JOB.lagjob|- [options]

Sizes every run of the list and prints a table. - reads a CSV from standard input.

  --json            print one JSON object instead of the table
  --out FILE        write the result to FILE: .json, .csv or .txt
  --force           let --out replace a file that is there
  --units si|us     units of what is printed (default si; JSON and CSV are always SI)
  --job JOB.lagjob  take defaults from this job
  --help            this text
  --version         the version

The list has a header row and a row for every run: tag, shape, size (DN 50, NPS 2, CU 28) or od_mm, length_m,
medium_c or pressure_bar_g, air_c, and material, layers, conductivity_w_mk or thickness_mm. Separators are comma,
semicolon or tab. See db/demo/harrowmere-creamery.csv for an example.

Exit codes
  0  done
  1  done, but a run cannot meet its limits
  2  something in the input is not right; nothing was written; every problem is on standard error, one a line
  3  Lagwright itself failed
`
