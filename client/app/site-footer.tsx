import { useTheme } from '#client/lib/theme.ts';
import { RadioGroup } from '#client/ui/choice.tsx';
import { useChoosePreferences } from './preferences.ts';

const choices = [
  { value: 'system', label: 'As the device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
] as const;

/** The cautions that belong under every page, and the theme. */
export function SiteFooter({ version }: { version: string | undefined }) {
  const [theme] = useTheme();
  const choose = useChoosePreferences();
  return (
    <footer className="site-footer">
      <div className="page flex flex-wrap items-start justify-between gap-x-10 gap-y-4">
        <div className="max-w-[76ch]">
          <p>
            Values are reports from the literature, not design data. Values outside their valid range are marked extrapolated.
            Relief, runaway and reactor safety work follows local codes and is done by licensed or otherwise competent people.
          </p>
          {version && <p className="pt-1">{`Sillstone ${version}`}</p>}
        </div>
        <div className="theme-choice">
          <RadioGroup legend="Theme" hideLegend name="theme" look="segments" choices={choices} value={theme} onChange={(next) => choose({ theme: next })} />
        </div>
      </div>
    </footer>
  );
}
