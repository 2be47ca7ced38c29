import { sql } from "drizzle-orm";
import { database } from "@/db/client";

/** @throws when the database cannot be read */
export function checkDatabase(): void {
  database().get(sql`select count(*) from teams`);
}
