import { createContext, type ReactNode, useContext } from 'react'
import food from '#shared/messages/food.en.json?compiled'
import { makeTranslator, type Translate } from '#shared/messages/translate.ts'
import type { Locale } from '#shared/wire.ts'
import type english from '../locales/en.json'
import web from '../locales/en.json?compiled'

export type MessageKey = keyof typeof english

type Words = { locale: Locale; t: Translate<MessageKey>; food: Translate }

const englishWords: Words = {
  locale: 'en',
  t: makeTranslator<MessageKey>('en', web),
  food: makeTranslator('en', food),
}

const WordsContext = createContext<Words>(englishWords)

/** The words of a language, outside of components. */
export function wordsOf(_locale: Locale): Words {
  return englishWords
}

/** Gives everything inside the words of one language. */
export function WordsProvider(props: { locale: Locale; children: ReactNode }) {
  return <WordsContext value={wordsOf(props.locale)}>{props.children}</WordsContext>
}

export function useWords(): Words {
  return useContext(WordsContext)
}
