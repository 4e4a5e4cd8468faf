import { readdirSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { goodList, place, slow } from './command.ts'

const sized = 'tag,shape,size,medium_c,air_c,material,max_loss_w_m'
const run = (tag: string, ...cells: readonly string[]) => [tag, 'pipe', ...cells].join(',')

/** Every kind of bad list once, through a real process; all the fine cases are in the tests of the reader. */
const badLists: readonly (readonly [
  name: string,
  list: string | Uint8Array,
  problems: readonly unknown[],
])[] = [
  [
    'an empty file',
    '',
    ['the file: found nothing in it; allowed: a header row and a row for every run'],
  ],
  [
    'no runs',
    `${sized}\n`,
    ['the file: found no runs; allowed: a row for every run below the header'],
  ],
  [
    'bad cells in several rows',
    `${sized}\n${run('A', 'DN 50', 'hot', '20', 'x', '1e999')}\n${run('A', 'DN 50', '80', 'NaN', 'x', '5')}\n`,
    [
      'row 2, column medium_c: found "hot"; allowed: a number from −200 to 1000 °C',
      'row 2, column max_loss_w_m: found "1e999"; allowed: a number from 0.01 to 1000000 W/m',
      expect.stringMatching(/^row 2, column material: found x; allowed: a material of/),
      'row 3, column air_c: found "NaN"; allowed: a number from −70 to 200 °C',
      'row 3, column tag: found "A", as in row 2; allowed: a tag of its own for every run',
      expect.stringMatching(/^row 3, column material: found x; allowed: a material of/),
    ],
  ],
  [
    'cells, names and values that do not go together, each in another row',
    `${sized}\n${run('A', 'DN 50', '80', '20', 'eps', '1e999')}\n${run('B', 'DN 81', '80', '20', 'nope', '5')}\n${run('C', 'DN 80', '', '20', 'eps', '5')}\n${run('D', 'DN 80', '80', 'x', 'eps', '5')}\n`,
    [
      'row 2, column max_loss_w_m: found "1e999"; allowed: a number from 0.01 to 1000000 W/m',
      expect.stringMatching(/^row 3, column size: found DN 81; allowed: a DN of the table; /),
      expect.stringMatching(/^row 3, column material: found nope; allowed: a material of /),
      'row 4, column medium_c: found nothing; allowed: the temperature of the medium in °C, or pressure_bar_g if it is saturated steam',
      'row 5, column air_c: found "x"; allowed: a number from −70 to 200 °C',
    ],
  ],
  [
    'columns that every run lacks',
    'tag,length_m\nA,3\nB,4\n',
    [
      'row 1, column shape: found no such column; allowed: pipe, round-duct, rect-duct, flat, sphere or vessel',
      'row 1, column medium_c: found no such column; allowed: the temperature of the medium in °C, or pressure_bar_g if it is saturated steam',
      'row 1, column air_c: found no such column; allowed: the temperature of the air around the run in °C',
      'row 1, column material: found no such column; allowed: a material of the catalogue, conductivity_w_mk, layers, or thickness_mm 0 for a bare run',
    ],
  ],
  [
    'a column that one run lacks',
    'tag,shape,size,pressure_bar_g,air_c,material,max_loss_w_m\nA,pipe,DN 50,5,20,eps,20\nB,pipe,DN 50,,20,eps,20\n',
    [
      'row 3, column medium_c: found nothing; allowed: the temperature of the medium in °C, or pressure_bar_g if it is saturated steam',
    ],
  ],
  [
    'what a cell that cannot be read may have been meant for',
    'tag,shape,od_mm,air_c,pressure_bar_g,thickness_mm\nA,pipe,wide,20,high,none\n',
    [
      'row 2, column od_mm: found "wide"; allowed: a number from 1 to 20000 mm',
      'row 2, column pressure_bar_g: found "high"; allowed: a number from −0.95 to 217 bar g',
      expect.stringMatching(/^row 2, column thickness_mm: found "none"; allowed: a number/),
    ],
  ],
  [
    'columns unknown, repeated and to come',
    'tag,meduim_c,air_c,Air_F,access\nA,80,20,68,2\n',
    [
      'row 1, column meduim_c: found an unknown column; allowed: known columns, of which medium_c is the nearest',
      'row 1, column air_f: found the same as column air_c again; allowed: each column once, in one unit',
      'row 1, column access: found a column that is not yet supported; allowed: the list without it',
    ],
  ],
  [
    'words that are no choice',
    'tag,shape,od_mm,orientation,medium_c,air_c,material\nA,cube,80,leaning,80,20,eps\n',
    [
      'row 2, column shape: found "cube"; allowed: one of pipe, round-duct, rect-duct, flat, sphere, vessel',
      'row 2, column orientation: found "leaning"; allowed: one of horizontal, vertical, inclined, up, down',
    ],
  ],
  ['a torn row', `${sized}\nA,pipe,DN`, ['row 2: found 3 cells; allowed: 7, as in the header']],
  [
    'bytes that are not text',
    Uint8Array.of(0x74, 0x61, 0x67, 0x0a, 0xff),
    [
      'row 2: found a byte (hexadecimal ff) that is not UTF-8 text; allowed: UTF-8 text; save the file as "CSV UTF-8"',
    ],
  ],
]

describe('bad input', slow, () => {
  it.each(badLists)(
    '%s: ends with 2, every problem on a line, nothing written',
    async (_name, list, problems) => {
      const { folder, put, lagwright } = place()
      put('runs.csv', list)
      for (const extra of [['--out', 'result.csv'], ['--json']]) {
        const { code, out, err } = await lagwright('size', 'runs.csv', ...extra)
        expect(err).toEqual(problems)
        expect(out).toBe('')
        expect(code).toBe(2)
      }
      expect(readdirSync(folder)).toEqual(['runs.csv'])
    },
  )

  it('that shows only when runs are sized is named with its rows, all at once', async () => {
    const list = [
      sized,
      run('A', '', '80', '20', 'stone_wool_pipe_section', '20'),
      run('OK', 'DN 50', '80', '20', 'stone_wool_pipe_section', '20'),
      '',
      run('B', 'DN 50', '', '20', 'stone_wool_pipe_section', '20'),
      run('C', 'DN 50', '80', '20', 'no_such_wool', '20'),
    ].join('\n')
    const { code, out, err } = await place().lagwrightReading(list, 'size', '-')
    expect(err.map((line) => line.split(':')[0])).toEqual([
      'row 2, column size',
      'row 5, column medium_c',
      'row 6, column material',
    ])
    expect(err[2]).toContain('no_such_wool')
    expect(out).toBe('')
    expect(code).toBe(2)
  })

  it.each([
    [[], ['found no command; allowed: size, loss, working. See --help.']],
    [['frob'], ['found the unknown command "frob"; allowed: size, loss, working. See --help.']],
    [['size'], ['found no list of runs; allowed: RUNS.csv, JOB.lagjob, or - for standard input']],
    [['size', 'a.csv', 'b.csv'], ['found 2 inputs; allowed: one list of runs']],
    [['size', 'a.csv', '--units'], ['--units: found no value; allowed: --units si|us']],
    [['size', 'a.csv', '--json', '--json'], ['--json: found twice; allowed: once']],
    [
      ['size', 'a.csv', '--tag', 'A-1'],
      [
        '--tag: not an option of size; allowed: --json, --out FILE, --force, --units si|us, --job JOB.lagjob, --help, --version',
      ],
    ],
    [['working', 'a.csv'], ['found no run to work out; allowed: --tag TAG']],
    [
      ['working', 'a.csv', '--tag', 'A-1', '--units', 'us', '--out', 'a.csv'],
      [
        '--units: not an option of working; allowed: --json, --out FILE, --force, --job JOB.lagjob, --tag TAG, --help, --version',
        '--out: found "a.csv"; allowed: a file name that ends in .json, .txt',
      ],
    ],
    [
      [
        'size',
        'a.csv',
        '--jsn',
        '--units',
        'metric',
        '--out',
        'a.pdf',
        '--job',
        'b.csv',
        '--force=yes',
      ],
      [
        'found the unknown option "--jsn"; allowed: --json, --out FILE, --force, --units si|us, --job JOB.lagjob, --help, --version',
        '--force: found a value; allowed: none',
        '--out: found "a.pdf"; allowed: a file name that ends in .json, .csv, .txt',
        '--units: found "metric"; allowed: si, us',
        '--job: found "b.csv"; allowed: a file name that ends in .lagjob',
      ],
    ],
    [
      ['size', 'nowhere.csv', '--out', 'no/such/folder.csv'],
      [
        expect.stringMatching(
          /^--out: there is no folder .*such; allowed: a folder that is there$/,
        ),
        'nowhere.csv: there is no such file; allowed: a list of runs as CSV, a job that ends in .lagjob, or -',
      ],
    ],
    [
      ['size', '.'],
      ['.: this is a folder; allowed: a list of runs as CSV, a job that ends in .lagjob, or -'],
    ],
  ])('on the command line %j', async (words, problems) => {
    const { code, out, err } = await place().lagwright(...words)
    expect(err).toEqual(problems)
    expect(out).toBe('')
    expect(code).toBe(2)
  })

  it.each(['touch', 'quote', 'walkdown'])('%s is refused by name', async (door) => {
    const { put, lagwright } = place()
    const { code, err } = await lagwright(door, put('runs.csv', goodList))
    expect(err).toEqual([`the command ${door} is not yet supported; allowed: size, loss, working`])
    expect(code).toBe(2)
  })
})

describe('asking', slow, () => {
  it.each([
    [['--help'], 'lagwright working RUNS.csv|JOB.lagjob|- --tag TAG'],
    [['-h'], 'lagwright loss RUNS.csv|JOB.lagjob|-'],
    [['size', '--help'], 'lagwright size RUNS.csv|JOB.lagjob|- [options]'],
    [['loss', 'runs.csv', '--help'], 'whether or not limits are met'],
    [['working', '-h'], '--tag TAG'],
  ])('for help with %j', async (words, said) => {
    const { code, out, err } = await place().lagwright(...words)
    expect(out).toContain(said)
    expect(err).toEqual([])
    expect(code).toBe(0)
  })

  it('for the version', async () => {
    const { code, out } = await place().lagwright('--version')
    expect(out).toMatch(/^lagwright \d+\.\d+\.\d+\n$/)
    expect(code).toBe(0)
  })
})
