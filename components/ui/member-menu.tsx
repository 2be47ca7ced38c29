import type { Route } from "next";
import Link from "next/link";
import { useId } from "react";
import { MemberDisc } from "@/components/ui/member-disc";
import { ThemeSwitch } from "@/components/ui/theme-switch";

export interface BarMember {
  name: string;
  email: string;
  role: string;
}

interface MemberMenuProps {
  member: BarMember;
  teamName: string;
  signOut: () => void | Promise<void>;
  account?: Route;
}

/** The member's disc; it opens who you are, the theme, and the way out. Closes by Esc or a click elsewhere. */
export function MemberMenu({ member, teamName, signOut, account }: MemberMenuProps) {
  const id = useId();
  return (
    <>
      <button
        type="button"
        popoverTarget={id}
        aria-label={`Account of ${member.name}`}
        className="-m-2 rounded-full p-2"
      >
        <MemberDisc name={member.name} />
      </button>
      <div
        id={id}
        popover="auto"
        className="inset-auto top-13.5 right-7 m-0 w-72 border border-ink border-t-transparent bg-paper p-4 text-ink phone:right-4"
      >
        <p className="text-row font-[640]">{member.name}</p>
        <p className="text-label text-ink-2">
          {member.email}
          <br />
          {member.role}, {teamName}
        </p>
        <div className="mt-3 border-t border-line pt-3">
          <ThemeSwitch />
        </div>
        <form action={signOut} className="mt-3 flex items-center justify-between border-t border-line pt-3">
          <button type="submit" className="link min-h-6 font-[560]">
            Sign out
          </button>
          {account && (
            <Link href={account} className="link text-label">
              Account
            </Link>
          )}
        </form>
      </div>
    </>
  );
}
