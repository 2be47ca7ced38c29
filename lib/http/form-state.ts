/** What a server action hands back to its form when it refuses. */
import { AppError, type FieldErrors } from "@/lib/http/errors";

export interface FormState {
  /** a sentence about the whole; undefined while nothing is wrong */
  message?: string;
  fields: FieldErrors;
  /** what was typed: React empties a form after its action, so it is given back as default values */
  values: Record<string, string>;
}

export const emptyForm: FormState = { fields: {}, values: {} };

/** The texts of a form; React's own hidden fields start with $ and are left out. */
export function formValues(form: FormData): Record<string, string> {
  const texts = [...form].filter(
    (entry): entry is [string, string] => !entry[0].startsWith("$") && typeof entry[1] === "string",
  );
  return Object.fromEntries(texts);
}

/** A refusal as the form's next state, without passwords; anything but a refusal is thrown on. */
export function formFailure(error: unknown, form: FormData): FormState {
  if (!(error instanceof AppError)) throw error;
  const values = Object.entries(formValues(form)).filter(([name]) => !/password/i.test(name));
  return { message: error.message, fields: error.fields, values: Object.fromEntries(values) };
}
