import { describe, expect, it } from 'vitest'
import { formatProblem } from '../../src/budget/format-problem.js'
import { base, head, readTern } from './composed.js'
import { small } from './read.js'

interface Case {
  readonly name: string
  /** `budgets/tern/budget.yaml`. */
  readonly text: string
  /** Beside `budgets/drum/budget.yaml`. */
  readonly files?: Readonly<Record<string, string>>
  readonly told: readonly string[]
}

const tern = 'budgets/tern/budget.yaml'
const drum = 'budgets/drum/budget.yaml'
const shared = (name: string) => `budgets/shared/${name}.yaml`
const including = (list: string) => `${head}include: ${list}\n`
const varied = (changes: string) => `${small}variants:\n  cold:\n    changes:\n${changes.replace(/^/gm, '      ')}\n`

/** All wording of what several files, or a budget and its variants, can do to each other; every line was read by a person. */
const cases: readonly Case[] = [
  {
    name: 'from: a file that is not there',
    text: head.replace('drum', 'dram'),
    told: [`[file] ${tern}:4:7: the file \`../dram/budget.yaml\` does not exist`],
  },
  {
    name: 'from: a folder',
    text: head.replace('/budget.yaml', ''),
    told: [`[file] ${tern}:4:7: \`../drum\` is no YAML file; name the file itself, such as \`../tern/budget.yaml\``],
  },
  {
    name: 'from: outside the project',
    text: head.replace('../drum', '../../../drum'),
    told: [
      `[file] ${tern}:4:7: \`../../../drum/budget.yaml\` must be a path from the folder of this file that stays inside the project`,
    ],
  },
  {
    name: 'from: a path from the root of the disk',
    text: head.replace('../drum', '/srv'),
    told: [
      `[file] ${tern}:4:7: \`/srv/budget.yaml\` must be a path from the folder of this file that stays inside the project`,
    ],
  },
  {
    name: 'from: several',
    text: head.replace('../drum/budget.yaml', '[../drum/budget.yaml]'),
    told: [`[type] ${tern}:4:1: \`from\` must be the path of one budget file, such as \`../tern/budget.yaml\``],
  },
  {
    name: 'from: nothing',
    text: head.replace('../drum/budget.yaml', ''),
    told: [`[type] ${tern}:4:1: \`from\` must be the path of one budget file, such as \`../tern/budget.yaml\``],
  },
  {
    name: 'from: itself',
    text: head.replace('../drum/', ''),
    told: [`[circle] ${tern}:4:7: \`${tern}\` builds on \`${tern}\`: take one of these paths out`],
  },
  {
    name: 'from: a circle of two',
    text: head,
    files: { [drum]: head.replace('drum', 'tern') },
    told: [
      `[circle] ${drum}:4:7: \`${tern}\` builds on \`${drum}\` builds on \`${tern}\`: take one of these paths out`,
    ],
  },
  {
    name: 'from: a file without format',
    text: head,
    files: { [drum]: small.replace('format: 1\n', '') },
    told: [`[missing-key] ${drum}:1:1: this file needs the key \`format\`; write \`format: 1\``],
  },
  {
    name: 'from: a file of another format',
    text: head,
    files: { [drum]: small.replace('format: 1', 'format: 2') },
    told: [`[format] ${drum}:1:9: \`format\` must be \`1\``],
  },
  {
    name: 'from: a file that is no map',
    text: head,
    files: { [drum]: '- 1\n' },
    told: [`[type] ${drum}:1:1: this file must be a map of keys, the first of which is \`format: 1\``],
  },
  {
    name: 'from: a file that is no YAML',
    text: head,
    files: { [drum]: 'format: 1\ntitle: [\n' },
    told: [`[yaml] ${drum}:3:1: a bracket that was opened is not closed before this line`],
  },
  {
    name: 'no title and revision of its own',
    text: 'format: 1\nfrom: ../drum/budget.yaml\n',
    told: [
      `[missing-key] ${tern}:1:1: a budget needs the key \`title\` (its name on pages; each budget states its own)`,
      `[missing-key] ${tern}:1:1: a budget needs the key \`revision\` (dotted numbers: 2.1; each budget states its own)`,
    ],
  },
  {
    name: 'an inherited fault, where it stands',
    text: head,
    files: { [drum]: small.replace('3.1(2) ng', '3.1(2) nm') },
    told: [`[quantity] ${drum}:8:34: \`3.1(2) nm\` is a length; a mass is wanted, such as \`3.1 ng\``],
  },
  {
    name: 'an inherited key that is unknown',
    text: head,
    files: { [drum]: small.replace('quality:', 'qualty:') },
    told: [
      `[missing-key] ${drum}:8:3: \`drum\` needs \`quality\` or \`losses\``,
      `[unknown-key] ${drum}:8:67: unknown key \`qualty\` in \`drum\`; allowed are \`kind\`, \`mass\`, \`frequency\`, \`quality\`, \`law\`, \`losses\`, \`temperature\`, \`moved_mass\`, \`strain_length\`; did you mean \`quality\`?`,
    ],
  },
  {
    name: 'a name that both sides use for different things',
    text: `${head}parameters: { cavity: 3 K }\n`,
    told: [
      `[name-taken] ${drum}:9:3: \`cavity\` is already the name of one of the parameters (${tern}:5); choose another`,
      `[unused] ${tern}:5:23: warning: the parameter \`cavity\` is not used; delete it or name it in a field`,
    ],
  },
  {
    name: 'what both sides claim',
    text: `${head}contributions: { heat: { of: drum.bath } }\n`,
    files: { [drum]: `${small}contributions: { thermal: { of: drum.bath } }\n` },
    told: [
      `[claimed-twice] ${tern}:5:30: \`drum.bath\` is claimed by \`thermal\` (${drum}:17) and by \`heat\`; it may count once: take it out of one of them`,
    ],
  },
  {
    name: 'a deletion of what is not there',
    text: `${head}components: { drum: { qualty: ~ } }\n`,
    told: [
      `[nothing-deleted] ${tern}:5:31: \`~\` takes a key away, but what stands below has no \`qualty\`; it has \`kind\`, \`mass\`, \`frequency\`, \`quality\`, \`temperature\`; did you mean \`quality\`?`,
    ],
  },
  {
    name: 'a deletion of what is needed',
    text: `${head}components: { drum: { mass: ~ }, detector: null }\n`,
    told: [
      `[unknown-name] ${drum}:5:10: no component is called \`detector\`; this file has no detector`,
      `[missing-key] ${tern}:5:15: \`drum\` needs the key \`mass\` (effective mass for unit amplitude at the reference point)`,
    ],
  },
  {
    name: 'a key with nothing behind it, which deletes nothing',
    text: `${head}components: { drum: { quality: } }\n`,
    told: [`[type] ${tern}:5:23: \`quality\` must be a quantity such as \`3.1(2) ng\`; here stands nothing`],
  },
  {
    name: 'an inherited alternative that stays beside the new one',
    text: `${head}components: { cavity: { pump: { quanta: 1e5 } } }\n`,
    told: [`[exclusive] ${tern}:5:33: \`cavity.pump\` has \`power\` and \`quanta\`; keep one of them`],
  },
  {
    name: 'include: a map',
    text: including('{ a: b }'),
    told: [
      `[type] ${tern}:5:1: \`include\` must be the path of a shared part or a list of them: \`[../shared/cryostat.yaml]\``,
    ],
  },
  {
    name: 'include: an empty list',
    text: including('[]'),
    told: [
      `[type] ${tern}:5:1: \`include\` must be the path of a shared part or a list of them: \`[../shared/cryostat.yaml]\``,
    ],
  },
  {
    name: 'include: files that are not there, each told',
    text: including('[../shared/a.yaml, ../shared/b.yaml]'),
    told: [
      `[file] ${tern}:5:11: the file \`../shared/a.yaml\` does not exist`,
      `[file] ${tern}:5:29: the file \`../shared/b.yaml\` does not exist`,
    ],
  },
  {
    name: 'include: a whole budget',
    text: including('../drum/budget.yaml'),
    told: [
      `[unknown-key] ${drum}:3:1: \`revision\` belongs to a budget, not to a shared part; a budget builds on another one with \`from\``,
    ],
  },
  {
    name: 'include: a misspelt section',
    text: including('../shared/a.yaml'),
    files: { [shared('a')]: 'format: 1\nparamters: { a: 3 K }\n' },
    told: [
      `[unknown-key] ${shared('a')}:2:1: unknown key \`paramters\` in a shared part; allowed are \`format\`, \`title\`, \`about\`, \`include\`, \`parameters\`, \`components\`, \`contributions\`; did you mean \`parameters\`?`,
    ],
  },
  {
    name: 'include: a section that is no map',
    text: including('../shared/a.yaml'),
    files: { [shared('a')]: 'format: 1\nparameters: 3 K\n' },
    told: [`[type] ${shared('a')}:2:13: \`parameters\` must be a map of names`],
  },
  {
    name: 'include: one id in two parts',
    text: including('[../shared/a.yaml, ../shared/b.yaml]'),
    files: {
      [shared('a')]: 'format: 1\nparameters: { base: 3 K }\n',
      [shared('b')]: 'format: 1\nparameters:\n  base: 4 K\n',
    },
    told: [
      `[included-twice] ${tern}:5:29: \`base\` stands in two shared parts, at ${shared('a')}:2 and at ${shared('b')}:3; rename one, or include only one of them`,
    ],
  },
  {
    name: 'include: a circle',
    text: including('../shared/a.yaml'),
    files: {
      [shared('a')]: 'format: 1\ninclude: b.yaml\n',
      [shared('b')]: 'format: 1\ninclude: a.yaml\n',
    },
    told: [
      `[circle] ${shared('b')}:2:10: \`${shared('a')}\` builds on \`${shared('b')}\` builds on \`${shared('a')}\`: take one of these paths out`,
    ],
  },
  {
    name: 'a shared value of the wrong dimension, used elsewhere',
    text: `${including('../shared/a.yaml')}components: { drum: { temperature: base } }\n`,
    files: { [shared('a')]: 'format: 1\nparameters:\n  base: 4 W\n' },
    told: [
      `[quantity] ${tern}:6:36: \`4 W\` is a power; a temperature is wanted, such as \`4.1 K\` (parameter \`base\`, ${shared('a')}:3)`,
    ],
  },
  {
    name: 'variant: a name that nothing has',
    text: varied('drumm.quality: 1e9'),
    told: [
      `[unknown-name] ${tern}:20:7: variant \`cold\`: no parameter, component or line is called \`drumm\`; did you mean \`drum\`?`,
    ],
  },
  {
    name: 'variant: a name that is near to none',
    text: varied('temperature: 4 K'),
    told: [
      `[unknown-name] ${tern}:20:7: variant \`cold\`: no parameter, component or line is called \`temperature\`; a change begins with the id of one, such as \`drum\``,
    ],
  },
  {
    name: 'variant: a misspelt field',
    text: varied('drum.qualty: 1e9'),
    told: [
      `[unknown-key] ${tern}:20:7: variant \`cold\`: unknown key \`qualty\` in \`drum\`; allowed are \`kind\`, \`mass\`, \`frequency\`, \`quality\`, \`law\`, \`losses\`, \`temperature\`, \`moved_mass\`, \`strain_length\`; did you mean \`quality\`?`,
    ],
  },
  {
    name: 'variant: a step on the way that is not there',
    text: varied('cavity.ports.bak.rate: 1 MHz'),
    told: [
      `[unknown-name] ${tern}:20:7: variant \`cold\`: \`cavity.ports\` has no \`bak\`; there are \`front\`, \`back\`; did you mean \`back\`?`,
    ],
  },
  {
    name: 'variant: a way through a plain value',
    text: varied('drum.mass.evidence: assumed'),
    told: [
      `[unknown-name] ${tern}:20:7: variant \`cold\`: \`drum.mass.evidence\` leads into a plain value; change \`drum.mass\` as a whole`,
    ],
  },
  {
    name: 'variant: a value of the wrong dimension',
    text: varied('drum.temperature: 20 mW'),
    told: [
      `[quantity] ${tern}:20:25: variant \`cold\`: \`20 mW\` is a power; a temperature is wanted, such as \`4.1 K\``,
    ],
  },
  {
    name: 'variant: what it may not change',
    text: varied('measurand: { quantity: force }\nrevision: 3\nvariants: ~\nband: 1 Hz to 2 Hz'),
    told: [
      `[not-changed] ${tern}:20:7: variant \`cold\`: \`measurand\` is shared by all curves that are drawn together; a variant cannot change it`,
      `[not-changed] ${tern}:21:7: variant \`cold\`: \`revision\` belongs to the budget as a whole; a variant cannot change it`,
      `[not-changed] ${tern}:22:7: variant \`cold\`: \`variants\` belongs to the budget as a whole; a variant cannot change it`,
      `[not-changed] ${tern}:23:7: variant \`cold\`: \`band\` is shared by all curves that are drawn together; a variant cannot change it`,
    ],
  },
  {
    name: 'variant: one thing changed twice',
    text: varied('drum: { quality: 1e8 }\ncomponents.drum.quality: 1e9'),
    told: [
      `[changed-twice] ${tern}:21:7: variant \`cold\`: \`components.drum.quality\` changes what another line of this variant changes too; keep one of them`,
    ],
  },
  {
    name: 'variant: taking away what others need',
    text: varied('cavity.ports.back: ~'),
    told: [
      `[unknown-name] ${tern}:16:38: variant \`cold\`: \`cavity\` has no port \`back\`; there is \`cavity.front\``,
    ],
  },
  {
    name: 'variant: no changes',
    text: `${small}variants: { cold: { title: Colder } }\n`,
    told: [
      `[missing-key] ${tern}:17:13: \`cold\` needs the key \`changes\` (path and new value: { cavity.pump.power: 3 µW }; \`~\` takes away)`,
    ],
  },
  {
    name: 'variant: a fault that the budget has too is told once',
    text: varied('drum.temperature: 2 K').replace('3.1(2) ng', '3.1(2) nm'),
    told: [`[quantity] ${tern}:8:34: \`3.1(2) nm\` is a length; a mass is wanted, such as \`3.1 ng\``],
  },
  {
    name: 'more variants than curves can be told apart',
    text: `${small}variants:\n${[...'abcdfgjkl'].map(id => `  ${id}${id}: { changes: { drum.quality: 1e8 } }\n`).join('')}`,
    told: [`[count] ${tern}:17:1: \`variants\` must have at most 8 entries`],
  },
]

describe('files that build on each other', () => {
  it.each(cases)('$name', ({ text, files, told }) => {
    const { budget, problems } = readTern({ ...base, ...files, [tern]: text })
    expect(problems.map(problem => `[${problem.code}] ${formatProblem(problem)}`)).toEqual(told)
    expect(budget === null).toBe(problems.some(problem => problem.severity === 'error'))
  })
})
