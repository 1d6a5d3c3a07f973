import type { MessageCompiler, MessageContext, MessageFunctionCallable, MessageFunctionReturn } from '@intlify/core-base'

type Part = string | { name: string }

const cache = new Map<string, MessageFunctionCallable>()

/**
 * Makes one message ready to take parameters: `{name}` stands for one, ` | ` between the forms for one and for several.
 * Messages use no other marks, and a parser of every mark would be a good part of what the client reads for its words.
 * @throws {RangeError} for a message that is no text.
 */
export const compileWords: MessageCompiler = (words) => {
  if (typeof words !== 'string') throw new RangeError('messages are texts')
  const known = cache.get(words)
  if (known !== undefined) return known
  const [first = [], ...others] = words.split('|').map((form) => readParts(form.trim()))
  const compiled: MessageFunctionCallable = <Piece>(context: MessageContext<Piece>) => {
    const chosen = others.length === 0 ? fill(first, context) : context.plural([first, ...others].map((form) => fill(form, context)))
    return chosen as MessageFunctionReturn<Piece>
  }
  cache.set(words, compiled)
  return compiled
}

function readParts(form: string): Part[] {
  return form.split(/\{(\w+)\}/).map((text, index) => (index % 2 === 1 ? { name: text } : text))
}

/** One text; or the pieces as they are, where a component puts elements between the words. */
function fill<Piece>(parts: readonly Part[], context: MessageContext<Piece>): Piece {
  const pieces = parts.map((part) => (typeof part === 'string' ? part : context.named(part.name)))
  return (context.type === 'text' ? pieces.map((piece) => String(piece ?? '')).join('') : pieces) as Piece
}
