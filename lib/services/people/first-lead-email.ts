/** `.invalid` is reserved: no mail ever reaches it, and nobody can own it. */
export const FIRST_LEAD_EMAIL = "first-lead@ebbline.invalid";

/** True for the stand-in whose address the first quality lead replaces with their own. */
export function isPlaceholder(email: string): boolean {
  return email === FIRST_LEAD_EMAIL;
}
