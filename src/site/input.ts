import type { Assessment } from '../model/assessment.js'
import type { Problem } from '../model/problem.js'

/** What the site says about itself; everything else comes from the budgets. */
export interface SiteProject {
  /** Folder that the budgets' paths are relative to. */
  readonly root: string
  readonly title: string
  readonly subtitle?: string | null
  /** ISO date (`2026-03-14`) of the commit that is built, or null outside git. */
  readonly date: string | null
}

/** One sensor's draft: an assessment, or the problems that stopped it. */
export interface SensorResult {
  readonly sensor: string
  readonly assessment: Assessment | null
  readonly problems: readonly Problem[]
}

export interface SiteInput {
  readonly project: SiteProject
  readonly results: readonly SensorResult[]
}
