import { ButtonLink } from "@/components/ui/button";
import { Hook } from "@/components/ui/hook";
import { Wordmark } from "@/components/ui/mark";

/** Nothing is kept under this address, or it is another team's. */
export default function NotFound() {
  return (
    <main id="main" className="page-margin pt-7">
      <Wordmark />
      <div className="mt-16 flex flex-wrap items-center gap-x-7 gap-y-4">
        <Hook />
        <div>
          <h1>Nothing hangs here</h1>
          <p className="mt-2 max-w-md text-ink-2">
            No page has this address. It may have been mistyped, or it belongs to a team you are not in.
          </p>
          <div className="mt-4 flex gap-2.5">
            <ButtonLink href="/runs" kind="main">
              To the runs
            </ButtonLink>
            <ButtonLink href="/cables">To the catalogue</ButtonLink>
          </div>
        </div>
      </div>
    </main>
  );
}
