/** A row as a question shows it. */
export interface AskedRow {
  readonly row: number
  readonly number: string
  readonly plate: string
  readonly name: string
  readonly model: string
}

export interface ListOption {
  readonly value: string
  /** What is chosen, in words. */
  readonly words: string
  /** A text goes with it: what the text is called; null where none does. */
  readonly asks: string | null
}

/** Something about a list that only the organiser knows. Its id is the same each time the same list is looked through. */
export interface ListQuestion {
  readonly id: string
  readonly asks: string
  readonly rows: readonly AskedRow[]
  readonly options: readonly ListOption[]
  /** An option that fits what is known, offered and never taken by itself. */
  readonly likely: string | null
  /** What was answered; null while it is open. */
  readonly answer: ListAnswer | null
  /** What the answer does, in words; empty while it is open. */
  readonly does: string
}

export interface ListAnswer {
  readonly id: string
  readonly value: string
  readonly text: string
}

/** Answers given so far, asked one by one; keeps the questions in the order they came up. */
export interface Asking {
  readonly questions: ListQuestion[]
  readonly ask: (question: Omit<ListQuestion, 'answer' | 'does'>, does: (answer: ListAnswer) => string | null) => ListAnswer | null
}

/** An answer counts where its option is offered and, where a text goes with it, `does` accepts that (null: it does not). */
export function startAsking(answers: readonly ListAnswer[]): Asking {
  const byId = new Map(answers.map((answer) => [answer.id, answer]))
  const questions: ListQuestion[] = []
  return {
    questions,
    ask: (question, does) => {
      const said = byId.get(question.id)
      const offered = said !== undefined && question.options.some(({ value }) => value === said.value) ? said : null
      const words = offered === null ? null : does(offered)
      const answer = words === null ? null : offered
      questions.push({ ...question, answer, does: words ?? '' })
      return answer
    },
  }
}
