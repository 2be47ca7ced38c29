import { useId } from "react";

/** The one ornament: a 4 px band of slanted strokes. */
export function Lay() {
  const id = useId();
  return (
    <svg width="100%" height="4" aria-hidden="true" className="block print:hidden">
      <defs>
        <pattern id={id} width="9" height="4" patternUnits="userSpaceOnUse">
          <path d="M-1 4L3 0M8 4L12 0" stroke="var(--copper)" strokeWidth="2.1" />
        </pattern>
      </defs>
      <rect width="100%" height="4" fill={`url(#${id})`} />
    </svg>
  );
}
