import type { Job, Run } from '#model/job.ts'

export function sampleRun(n: number): Run {
  return {
    id: `run-${n}`,
    values: {
      tag: `P-${n}`,
      shape: 'pipe',
      size: 'DN 50',
      lengthM: 10 + n,
      mediumC: 120,
      airC: 20,
    },
    drafts: n % 7 === 0 ? { wallM: 'about 3' } : {},
  }
}

export function sampleJob(runs = 20): Job {
  return {
    name: 'Harrowmere Creamery',
    site: 'Boiler house',
    defaults: { airC: 20, currency: 'EUR' },
    runs: Array.from({ length: runs }, (_, n) => sampleRun(n)),
  }
}
