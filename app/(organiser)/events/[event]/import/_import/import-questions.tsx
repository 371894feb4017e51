import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import type { ImportAnswer, ListAnswer } from './import-words'
import type { ImportDesk } from './use-import'

type Question = ImportAnswer['questions'][number]

/** What only the organiser knows about the list. No answer is taken by itself, not even a likely one. */
export function ImportQuestions({
  desk,
  plan: { questions, questionCount, openQuestions },
}: {
  readonly desk: ImportDesk
  readonly plan: ImportAnswer
}) {
  return (
    <section aria-labelledby="questions" className="grid gap-4">
      <div>
        <h2 id="questions" className="text-2xl">
          {openQuestions === 0 ? 'Answered' : openQuestions === 1 ? '1 question' : `${openQuestions} questions`}
        </h2>
        <p>What a list does not say is asked, never guessed. Answers go with the next dry run; nothing is written by them.</p>
        {questions.length < questionCount && (
          <p>
            The first {questions.length} of {questionCount} are shown.
          </p>
        )}
      </div>
      {questions.map((question) => (
        <Asked key={question.id} desk={desk} question={question} questions={questions} />
      ))}
    </section>
  )
}

interface AskedProps {
  readonly desk: ImportDesk
  readonly question: Question
  readonly questions: readonly Question[]
}

function Asked({ desk, question, questions }: AskedProps) {
  const { id, asks, rows, options, likely, does, answer } = question
  const said = desk.said.answers.find((one) => one.id === id)
  const set = (value: string, text: string) =>
    desk.say((before) => ({ ...before, answers: withAnswer(before.answers, { id, value, text }) }))
  const isLate = said !== undefined && (answer?.value !== said.value || answer.text !== said.text)
  return (
    <fieldset className="border-2 p-4">
      <legend className="px-1 font-bold">{asks}</legend>
      {rows.length > 0 && (
        <ul className="mb-2 grid gap-1">
          {rows.map(({ row, number, plate, name, model }) => (
            <li key={row}>
              <span className="text-muted">Row {row}:</span> <span className="font-bold">{number === '' ? 'no number' : number}</span>
              {[name, model, plate].filter((part) => part !== '').map((part) => ` · ${part}`)}
            </li>
          ))}
        </ul>
      )}
      <div className="grid">
        {options.map((option) => (
          <div key={option.value} className="flex flex-wrap items-center gap-x-3">
            <Choice
              type="radio"
              name={id}
              checked={said?.value === option.value}
              onChange={() => set(option.value, said?.value === option.value ? said.text : '')}
            >
              {option.words}
              {likely === option.value && <span className="text-muted"> (looks like it)</span>}
            </Choice>
            {option.asks !== null && (
              <input
                aria-label={option.asks}
                className="min-h-12 w-40 rounded-sm border-2 border-line bg-ground px-2"
                value={said?.value === option.value ? said.text : ''}
                onChange={({ target }) => set(option.value, target.value)}
              />
            )}
          </div>
        ))}
      </div>
      <SameForAll desk={desk} questions={questions} question={question} />
      {does !== '' && !isLate && <p className="mt-2 border-l-8 border-accent pl-3">{does}</p>}
      {answer === null && said !== undefined && !desk.isChanged && (
        <p role="alert" className="mt-2 border-l-8 border-line pl-3 font-bold">
          This answer cannot stand: what was typed is missing, or is taken already. Type another.
        </p>
      )}
    </fieldset>
  )
}

/** With a list of another numbering dozens are asked the same; nobody should press the same answer thirty times, nor have it pressed for them. */
function SameForAll({ desk, question, questions }: AskedProps) {
  const said = desk.said.answers.find(({ id }) => id === question.id)
  const option = question.options.find(({ value }) => value === said?.value)
  if (said === undefined || option?.asks !== null) return null
  const kind = question.id.split(':')[0]
  const answered = new Set(desk.said.answers.map(({ id }) => id))
  const others = questions.filter(
    ({ id, options }) =>
      id.split(':')[0] === kind && !answered.has(id) && options.some(({ value, asks }) => value === said.value && asks === null),
  )
  if (others.length < 2) return null
  return (
    <Button
      look="quiet"
      onClick={() =>
        desk.say((before) => ({ ...before, answers: others.reduce((all, { id }) => withAnswer(all, { ...said, id }), before.answers) }))
      }
    >
      Answer the other {others.length} of this kind the same way
    </Button>
  )
}

function withAnswer(answers: readonly ListAnswer[], answer: ListAnswer): readonly ListAnswer[] {
  return [...answers.filter(({ id }) => id !== answer.id), answer]
}
