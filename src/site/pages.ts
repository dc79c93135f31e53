import type { Assessment } from '../model/assessment.js'
import { formatProblem } from '../budget/format-problem.js'
import { conventions, type Convention } from '../report/conventions.js'
import { kindGroups, type KindGroup, type KindView } from '../report/kind-view.js'
import { reportView, type ReportView } from '../report/view.js'
import type { SensorResult, SiteInput } from './input.js'
import { reportPictures, type ReportPictures } from './pictures.js'

/** A page's place: its path below the site, and the way back up to the site's folder. */
export interface PagePlace {
  readonly path: string
  /** `../../` for `tern/draft/index.html`, empty for `index.html`. */
  readonly up: string
}

export interface ReportPage extends PagePlace {
  readonly view: ReportView
  readonly pictures: ReportPictures
  /** Whether this is the working budget's own address rather than the revision's. */
  readonly draft: boolean
}

export interface BrokenPage extends PagePlace {
  readonly sensor: string
  readonly problems: readonly string[]
}

/** A sensor on the front page: its report, or what stopped it. */
export interface SensorEntry {
  readonly sensor: string
  readonly path: string
  readonly report: Report | null
  readonly problems: readonly string[]
}

export interface Report {
  readonly view: ReportView
  readonly pictures: ReportPictures
}

/** The global data of the templates. */
export interface SitePages {
  readonly site: { readonly title: string; readonly subtitle: string; readonly date: string }
  readonly sensors: readonly SensorEntry[]
  readonly reports: readonly ReportPage[]
  readonly broken: readonly BrokenPage[]
  readonly kindGroups: readonly KindGroup[]
  readonly kinds: readonly (PagePlace & { readonly view: KindView })[]
  readonly conventions: readonly Convention[]
}

/** Everything that the templates print, in an order that depends on names alone. */
export function sitePages({ project, results }: SiteInput): SitePages {
  const sensors = results.toSorted((a, b) => (a.sensor < b.sensor ? -1 : 1)).map(sensorEntry)
  const groups = kindGroups()
  return {
    site: { title: project.title, subtitle: project.subtitle ?? '', date: project.date ?? '' },
    sensors,
    reports: sensors.flatMap(({ sensor, report }) => (report === null ? [] : reportPages(sensor, report))),
    broken: sensors.filter(({ report }) => report === null).map(brokenPage),
    kindGroups: groups,
    kinds: groups.flatMap(group => group.kinds).map(view => ({ ...placeOf(`catalogue/${view.kind}/index.html`), view })),
    conventions,
  }
}

function placeOf(path: string): PagePlace {
  return { path, up: '../'.repeat(path.split('/').length - 1) }
}

function sensorEntry({ sensor, assessment, problems }: SensorResult): SensorEntry {
  return {
    sensor,
    path: `${sensor}/draft/index.html`,
    report: assessment === null ? null : report(assessment),
    problems: problems.map(formatProblem),
  }
}

function report(assessment: Assessment): Report {
  return { view: reportView(assessment), pictures: reportPictures(assessment) }
}

/** The working budget's own address, and its revision's until that is published as a record. */
function reportPages(sensor: string, { view, pictures }: Report): readonly ReportPage[] {
  return [
    { ...placeOf(`${sensor}/draft/index.html`), view, pictures, draft: true },
    { ...placeOf(`${sensor}/${view.revision}/index.html`), view, pictures, draft: false },
  ]
}

function brokenPage({ sensor, path, problems }: SensorEntry): BrokenPage {
  return { ...placeOf(path), sensor, problems }
}
