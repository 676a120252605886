import type { Metadata } from 'next';
import { Bill } from '@/components/layout/bill';
import { SettingsForm } from '@/components/office/settings-form';
import { pageContext } from '@/lib/web/context';
import { OfficePage } from '../office-page';
import { saveSettingsAction } from './actions';

export const metadata: Metadata = { title: 'Settings', robots: { index: false } };

export default async function SettingsPage() {
  const ctx = await pageContext('settings.edit');
  return (
    <OfficePage ctx={ctx} here="/office/settings" bill={<Bill name="Settings" line="They hold from the moment they are kept, for places not yet taken too" />}>
      <SettingsForm action={saveSettingsAction} settings={ctx.club} />
    </OfficePage>
  );
}
