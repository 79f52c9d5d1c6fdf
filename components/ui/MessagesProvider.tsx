import { createContext, useContext, type ReactNode } from 'react'
import { createMessages } from '@/shared/messages/createMessages'
import type { Messages } from '@/shared/messages/messages.types'

const MessagesContext = createContext<Messages>(createMessages('en'))

interface MessagesProviderProps {
  readonly messages: Messages
  readonly children: ReactNode
}

/** Gives every component below it the texts of one language. */
export function MessagesProvider({ messages, children }: MessagesProviderProps) {
  return <MessagesContext value={messages}>{children}</MessagesContext>
}

/** The texts of the language in force: `t('today.title')`, and `locale` for `shared/format`. English outside a provider. */
export function useMessages(): Messages {
  return useContext(MessagesContext)
}
