/** Leads the keyboard to the main part of the page, past the navigation. */
export function focusMain(): void {
  document.getElementById('main')?.focus()
}
