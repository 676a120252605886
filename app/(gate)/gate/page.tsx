import type { Metadata, Viewport } from 'next';
import { GateApp } from '@/components/gate/gate-app';

export const metadata: Metadata = { title: 'The gate', robots: { index: false, follow: false } };
export const viewport: Viewport = { colorScheme: 'light' };

/** One static shell: who may open it is told by the pass in the fragment, which never reaches this page. */
export default function GatePage() {
  return <GateApp />;
}
