interface Props {
  designation: string;
  isHeld: boolean;
  toggle: () => void;
  className?: string;
}

/** Holds a cable up to compare, or puts it back. */
export function HoldButton({ designation, isHeld, toggle, className = "" }: Props) {
  return (
    <button
      type="button"
      aria-pressed={isHeld}
      aria-label={`Hold ${designation} to compare`}
      title={isHeld ? "Put back" : "Hold to compare"}
      onClick={toggle}
      className={`relative z-1 -m-1.5 inline-flex size-8 items-center justify-center rounded-full phone:size-11 ${className}`}
    >
      <svg width="18" height="18" aria-hidden="true" className="phone:size-5.5" viewBox="0 0 18 18">
        {isHeld ? (
          <>
            <circle cx="9" cy="9" r="8" fill="var(--copper)" />
            <path d="M5.2 9.2l2.7 2.7 5-5.6" fill="none" stroke="var(--on-copper)" strokeWidth="2" />
          </>
        ) : (
          <circle cx="9" cy="9" r="7.5" fill="none" stroke="var(--rule)" strokeWidth="1.5" />
        )}
      </svg>
    </button>
  );
}
