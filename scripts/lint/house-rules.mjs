// The house's own lint rules. Every message names what to use instead.

const PALETTE =
  'slate|gray|grey|zinc|neutral|stone|red|orange|amber|yellow|lime|green|emerald|teal|cyan|sky|blue|indigo|violet|purple|fuchsia|pink|rose'
const PROPERTY = 'bg|text|border|ring|fill|stroke|from|via|to|outline|decoration|shadow|accent|caret|divide|placeholder'
const PALETTE_CLASS = `(?:^|[ :\\x60])(?:${PROPERTY})(?:-[trblxyse])?-(?:(?:${PALETTE})-[0-9]{2,3}|black|white)(?:$|[ \\x2F])`
const HEX_CLASS = '\\[#[0-9a-fA-F]{3,8}'
const COLOUR_CURE = 'Use a token class with a meaning (bg-surface, text-ink, bg-fail): colours are named once, in app/globals.css.'
const CLOCK_CURE = 'Pure folders know no clock: take the instant or the venue day as an argument.'
const CHANCE_CURE = 'Pure folders draw no lots: take ids and random bytes as arguments (lib/platform/ids at the edge).'
const EDGE_CURE = 'Pure folders do no IO: take what is needed as an argument and let the caller do it.'

const IMPORT_BANS = [
  { key: 'zod', paths: [{ name: 'zod', message: "Import * as z from 'zod/mini': the full build costs every browser page 26 to 91 KB." }] },
  { key: 'lucia', paths: [{ name: 'lucia', message: 'Use lib/platform/session, the only place that knows lucia.' }] },
  {
    key: 'next-pwa',
    paths: [{ name: 'next-pwa', message: 'next-pwa belongs in its one config file, loaded in the production build only.' }],
  },
  {
    key: 'html5-qrcode',
    paths: [{ name: 'html5-qrcode', message: 'Use lib/scanner: it is 107 KB and is loaded only where a camera reads codes.' }],
  },
]

const SYNTAX_BANS = [
  { key: 'use server', selector: "ExpressionStatement[directive='use server']", message: 'No server actions: there is one door. Write a contract and a route with handle() from lib/http/server.' },
  { key: 'export *', selector: 'ExportAllDeclaration', message: 'No barrels: import the file named after the thing. (db/schema/index.ts alone may, for drizzle.)' },
  { key: 'async transaction', selector: "CallExpression[callee.property.name='transaction'] > :matches(ArrowFunctionExpression, FunctionExpression)[async=true]", message: 'better-sqlite3 commits an async transaction before its work is done. Load and await first, then decide and write synchronously inside.' },
  { key: 'danger', selector: "JSXAttribute[name.name='dangerouslySetInnerHTML']", message: 'Render text as text, or build the SVG as elements: what is set as HTML can be somebody’s script.' },
  { key: 'palette', selector: `Literal[value=/${PALETTE_CLASS}/]`, message: COLOUR_CURE },
  { key: 'palette', selector: `TemplateElement[value.raw=/${PALETTE_CLASS}/]`, message: COLOUR_CURE },
  { key: 'palette', selector: `JSXAttribute[name.name='className'] :matches(Literal[value=/${HEX_CLASS}/], TemplateElement[value.raw=/${HEX_CLASS}/])`, message: COLOUR_CURE },
  { key: 'empty catch', selector: 'CatchClause > BlockStatement[body.length=0]', message: 'Say what becomes of the failure: handle it, map it to a code, or rethrow.' },
] // prettier-ignore

const PURE_SYNTAX = [
  { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: CLOCK_CURE },
  { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: CLOCK_CURE },
  { selector: "CallExpression[callee.name='Date']", message: CLOCK_CURE },
  { selector: "MemberExpression[object.name='performance']", message: CLOCK_CURE },
  { selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']", message: CHANCE_CURE },
  { selector: "CallExpression[callee.object.name='crypto'][callee.property.name=/^(randomUUID|getRandomValues)$/]", message: CHANCE_CURE },
]

const PURE_GLOBALS = [
  ...['setTimeout', 'setInterval', 'setImmediate', 'queueMicrotask', 'requestAnimationFrame'].map((name) => ({ name, message: CLOCK_CURE })),
  ...['fetch', 'process', 'console', 'window', 'document', 'navigator', 'localStorage', 'indexedDB', 'WebSocket', 'EventSource', 'Buffer'].map((name) => ({ name, message: EDGE_CURE })),
] // prettier-ignore

const PURE_MODULES = ['node:*', 'react', 'react-dom', 'react/*', 'next', 'next/*', 'drizzle-orm', 'drizzle-orm/*', 'better-sqlite3', 'swr', 'server-only', '@/db/*', '@/app/*', '@/lib/platform/*', '@/lib/http/*'] // prettier-ignore

/**
 * The bans that hold everywhere, less those named in `allow` (by key); `pure` adds what a pure folder may not touch.
 * @param {{ readonly allow?: readonly string[], readonly pure?: boolean }} options
 * @returns {Record<string, import('eslint').Linter.RuleEntry>}
 */
export function banned({ allow = [], pure = false }) {
  const kept = ({ key }) => !allow.includes(key)
  const syntax = SYNTAX_BANS.filter(kept).map(({ selector, message }) => ({ selector, message }))
  const patterns = [
    { group: ['zod/v3', 'zod/v4', 'zod/v4/*'], message: "Import * as z from 'zod/mini'." },
    { group: ['../../../../*'], message: "Import from '@/…' instead of climbing four folders." },
    ...(pure ? [{ group: PURE_MODULES, message: EDGE_CURE }] : []),
  ]
  return {
    'no-restricted-imports': ['error', { paths: IMPORT_BANS.filter(kept).flatMap(({ paths }) => paths), patterns }],
    'no-restricted-syntax': ['error', ...syntax, ...(pure ? PURE_SYNTAX : [])],
    ...(pure ? { 'no-restricted-globals': ['error', ...PURE_GLOBALS] } : {}),
  }
}

export const bannedFor = { pure: banned({ pure: true }) }

const FRAMEWORK_NAMES = /^(\[.*\]|_?[a-z0-9]+(-[a-z0-9]+)*)(\.(test|bench|config|d|server|client|css))*$/
const NAMELESS = /^(utils?|helpers?|common|types|misc|shared)$/

const fileName = {
  meta: { type: 'suggestion', schema: [], messages: {
    kebab: 'Name the file in kebab-case after the one thing it exports ({{name}}).',
    nameless: '“{{name}}” says nothing: name the file after the one thing it exports.',
  } }, // prettier-ignore
  create: (context) => ({
    Program(node) {
      const name = context.filename.split(/[\\/]/).pop().replace(/\.(d\.ts|[cm]?[jt]sx?)$/, '').replace(/^\./, '')
      if (NAMELESS.test(name)) context.report({ node, messageId: 'nameless', data: { name } })
      else if (!FRAMEWORK_NAMES.test(name)) context.report({ node, messageId: 'kebab', data: { name } })
    },
  }), // prettier-ignore
}

const disableNeedsReason = {
  meta: { type: 'problem', schema: [], messages: { reason: 'Say after `--` why this rule cannot hold here, or mend the code.' } },
  create: (context) => ({
    Program() {
      for (const comment of context.sourceCode.getAllComments()) {
        if (/^\s*eslint-disable/.test(comment.value) && !/--\s*\S.{9,}/s.test(comment.value)) context.report({ loc: comment.loc, messageId: 'reason' })
      }
    },
  }), // prettier-ignore
}

export const houseRules = { rules: { 'file-name': fileName, 'disable-needs-reason': disableNeedsReason } }
