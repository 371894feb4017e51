import { execFileSync } from 'node:child_process'
import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { join, relative, resolve } from 'node:path'

const root = resolve(import.meta.dirname, '../..')
const NOT_OURS = new Set(['node_modules', '.next', '.git', '.demo', '.test', 'coverage', 'data', 'tour'])

/** Every file of the project, as paths from its root with `/`: what git tracks or would add; without git, what is there less what is generated. */
export function projectFiles(): readonly string[] {
  const listed = existsSync(join(root, '.git')) ? trackedOrNew() : walk(root)
  return listed.filter((file) => existsSync(join(root, file))).sort()
}

/** Source files of the given folders. */
export function sources(...folders: readonly string[]): readonly string[] {
  return projectFiles().filter((file) => folders.some((folder) => file.startsWith(`${folder}/`)) && /\.tsx?$/.test(file))
}

/** A file's text by its path from the project's root. */
export function textOf(file: string): string {
  return readFileSync(join(root, file), 'utf8')
}

export function jsonOf(file: string): unknown {
  return JSON.parse(textOf(file))
}

function trackedOrNew(): string[] {
  const output = execFileSync('git', ['ls-files', '-z', '--cached', '--others', '--exclude-standard'], { cwd: root, encoding: 'utf8' })
  return [...new Set(output.split('\0').filter((file) => file !== ''))]
}

function walk(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (NOT_OURS.has(entry.name)) return []
    const path = join(folder, entry.name)
    return entry.isDirectory() ? walk(path) : [relative(root, path).split('\\').join('/')]
  })
}
