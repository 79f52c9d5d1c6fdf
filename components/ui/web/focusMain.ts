/** Screen readers outside the web find the main part by themselves. */
export function focusMain(): void {}
