import { notFound } from "next/navigation";
import { AppError } from "@/lib/http/errors";

/** What a service returns, or the page that says there is no such thing; what may not be seen does not exist either. */
export function found<T>(read: () => T): T {
  try {
    return read();
  } catch (error) {
    if (error instanceof AppError && (error.code === "not_found" || error.code === "forbidden")) notFound();
    throw error;
  }
}
