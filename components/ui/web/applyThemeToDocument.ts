import type { Theme } from '@/components/ui/theme/tokens'

/** There is no document to colour outside the web. */
export function applyThemeToDocument(_theme: Theme): void {}
