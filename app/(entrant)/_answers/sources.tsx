interface SourceShown {
  readonly title: string
  readonly edition?: string | undefined
  readonly where?: string | undefined
  readonly confidence: string
}

/** Where a limit comes from, and how far that can be trusted. */
export function Sources({ source }: { readonly source: readonly SourceShown[] }) {
  if (source.length === 0) return null
  return (
    <details className="text-muted">
      <summary className="target flex cursor-pointer items-center underline">where the limit comes from</summary>
      <ul className="ml-5 list-disc">
        {source.map((one) => (
          <li key={`${one.title} ${one.where ?? ''}`}>
            {[one.title, one.edition, one.where].filter(Boolean).join(', ')} ({one.confidence})
          </li>
        ))}
      </ul>
    </details>
  )
}
