interface DemoAccountsProps {
  accounts: readonly { email: string; name: string; role: string }[];
  password: string | null;
  /** The address now in the form. */
  chosen: string;
  onChoose: (email: string) => void;
}

/** The demonstration accounts; a press fills the form. */
export function DemoAccounts({ accounts, password, chosen, onChoose }: DemoAccountsProps) {
  return (
    <section aria-labelledby="demo-accounts">
      <h2 id="demo-accounts">Demonstration accounts</h2>
      <p className="text-second">
        Invented people, one for each role. A press fills the form{password && <>; the password of all is <code>{password}</code></>}.
      </p>
      <ul className="mt-3 border-t border-rule">
        {accounts.map((account) => (
          <li key={account.email} className="border-b border-hairline">
            <button
              type="button"
              className="flex w-full flex-wrap justify-between gap-x-4 py-2 text-left hover:bg-raised"
              aria-pressed={chosen === account.email}
              onClick={() => onChoose(account.email)}
            >
              <span><strong>{account.name}</strong><span className="text-second"> · {account.role}</span></span>
              <code className="text-second">{account.email}</code>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
