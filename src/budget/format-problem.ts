import type { Problem } from '../model/problem.js'

/** The one printed form: `file:line:column: message`, on one line, with nothing in it that could steer a terminal. */
export function formatProblem(problem: Problem): string {
  const { file, line, column } = problem.place
  const mark = problem.severity === 'warning' ? 'warning: ' : ''
  return `${visible(file)}:${line}:${column}: ${mark}${visible(problem.message)}`
}

/** Control, direction and other invisible characters as escapes: `\u{202e}`. */
export function visible(text: string): string {
  return text.replace(
    /[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}]/gu,
    character => `\\u{${(character.codePointAt(0) ?? 0).toString(16)}}`,
  )
}
