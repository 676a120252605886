'use client';

import { ActionForm } from '@/components/forms/action-form';
import { PrintButton } from '@/components/layout/print-button';
import { Input } from '@/components/ui/input';
import type { FormAction } from '@/lib/core/form-state';
import { makeGatePassInput } from '@/lib/gate/schema';
import { passCardOf, type PassCard } from '@/lib/gate/views/pass-card';

/** Makes a pass for one gate. Its link and code are shown here once, to be printed or handed on, and nowhere again. */
export function GatePassForm({ action, stopId, garden }: { action: FormAction; stopId: string; garden: string }) {
  return (
    <ActionForm
      action={action}
      schema={makeGatePassInput}
      values={{ devices: '2' }}
      submit="Make a gate pass"
      tone="plain"
      whenDone="clear"
      done={(state) => {
        const card = passCardOf(state);
        return card && <NewPass card={card} garden={garden} />;
      }}
    >
      <input type="hidden" name="stopId" value={stopId} />
      <div className="grid gap-4 print:hidden">
        <Input name="helper" label="Helper" hint="Who stands at this gate, or which turn." autoComplete="off" required />
        <Input name="devices" label="Phones" hint="How many may open this pass." inputMode="numeric" autoComplete="off" defaultValue="2" required />
      </div>
    </ActionForm>
  );
}

/** A pass just made: its code on white for a camera, its link for a message. */
function NewPass({ card, garden }: { card: PassCard; garden: string }) {
  return (
    <div className="mt-3 grid gap-3">
      <svg role="img" aria-label={`Code of the gate pass for ${card.helper}`} viewBox={`0 0 ${card.size} ${card.size}`} className="w-56 bg-sun-paper text-sun-ink" shapeRendering="crispEdges">
        <path d={card.path} fill="currentColor" />
      </svg>
      <p>
        For {card.helper} at {garden}. Open this link on the phone, or hold its camera before the code:
      </p>
      <p className="figures break-all select-all">{card.link}</p>
      <p>It is shown this once. Whoever has it can open this gate, so hand it to nobody else.</p>
      <PrintButton>Print the pass</PrintButton>
    </div>
  );
}

/** Takes a pass back; its phones are refused at once. */
export function RevokeGatePassForm({ action, gatePassId, helper }: { action: FormAction; gatePassId: string; helper: string }) {
  return (
    <ActionForm action={action} submit={`Take it back from ${helper}`} tone="bare">
      <input type="hidden" name="gatePassId" value={gatePassId} />
    </ActionForm>
  );
}
