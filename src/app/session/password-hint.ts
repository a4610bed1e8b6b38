/** What the server asks of a password, beside every field that sets one. */
export const PASSWORD_HINT = 'At least 15 characters; a sentence is fine, pasting works.';
