import type { ReactNode } from 'react';
import { PageFrame } from '../../app/page-frame';
import { useMe } from '../../api/use-me';
import { PageHeader } from '../../ui/page-header';
import { Segmented } from '../../ui/segmented';
import { chooseTheme, useThemeChoice } from '../../ui/theme';
import { THEME_OPTIONS } from '../../ui/theme-switch';
import { NameForm } from './name-form';
import { PasswordForm } from './password-form';
import { SessionList } from './session-list';

export function SettingsPage() {
  const me = useMe();
  return (
    <PageFrame title="Settings" crumbs={[{ label: 'Settings' }]}>
      <div className="mx-auto max-w-3xl">
        <PageHeader title="Settings" note={me.email} />
        <Part title="Name" note="As colleagues read it on runs and interpretations.">
          <NameForm name={me.name} />
        </Part>
        <Part title="Theme" note="Kept on this device.">
          <ThemeChoice />
        </Part>
        <Part title="Password" note="The other sessions are signed out when it changes.">
          <PasswordForm />
        </Part>
        <Part title="Sessions" note="Where this account is signed in.">
          <SessionList />
        </Part>
      </div>
    </PageFrame>
  );
}

function Part({ title, note, children }: { title: string; note: string; children: ReactNode }) {
  return (
    <section className="grid gap-x-8 gap-y-3 border-t border-rule py-6 sm:grid-cols-[13rem_1fr]">
      <div>
        <h2 className="text-lg font-semibold">{title}</h2>
        <p className="text-sm text-muted">{note}</p>
      </div>
      <div className="min-w-0">{children}</div>
    </section>
  );
}

function ThemeChoice() {
  const choice = useThemeChoice();
  return <Segmented label="Theme" value={choice} options={THEME_OPTIONS} onChange={chooseTheme} />;
}
