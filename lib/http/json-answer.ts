/** An answer whose JSON was made elsewhere. */
export function jsonAnswer(json: Uint8Array<ArrayBuffer>): Response {
  return new Response(json, { headers: { "Content-Type": "application/json" } });
}
