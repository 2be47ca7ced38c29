import type { DemoSignIn } from "@/lib/team/demo";

interface DemoPeopleProps {
  people: DemoSignIn[];
  password: string;
  onChoose: (email: string) => void;
}

/** The demo's people by role; choosing one fills the form. */
export function DemoPeople({ people, password, onChoose }: DemoPeopleProps) {
  const roles = [...new Set(people.map(({ role }) => role))];
  return (
    <section aria-label="People of the demo" className="col-span-full mt-4 border-t border-rule pt-2 folded:mt-0">
      <h2 className="text-body">
        This is the demo{" "}
        <span className="text-label font-normal text-ink-2 [font-variation-settings:normal]">
          choose who to be; everyone’s password is <span className="figures text-ink">{password}</span>
        </span>
      </h2>
      <dl className="mt-1 flex flex-wrap gap-x-9 text-label phone:flex-col">
        {roles.map((role) => (
          <div key={role} className="flex items-baseline gap-x-3 phone:border-t phone:border-line phone:first:border-0">
            <dt className="text-ink-2 phone:w-18 phone:shrink-0">{role}</dt>
            <dd className="flex flex-wrap gap-x-3.5">
              {people
                .filter((person) => person.role === role)
                .map(({ name, email }) => (
                  <button
                    key={email}
                    type="button"
                    title={email}
                    onClick={() => onChoose(email)}
                    className="link min-h-6 text-left phone:min-h-11"
                  >
                    {name}
                  </button>
                ))}
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
