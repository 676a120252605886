'use server';
import { refresh } from 'next/cache';
import { settingsInput } from '@/lib/club/schema';
import { saveSettings } from '@/lib/club/settings';
import { action } from '@/lib/web/action';

export const saveSettingsAction = action({
  requires: 'settings.edit',
  input: settingsInput,
  run: saveSettings,
  after: () => {
    refresh();
    return { status: 'done', message: 'The settings are kept, and the change is in the audit trail.' };
  },
});
