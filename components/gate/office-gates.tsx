import { NipCard } from '@/components/drawing/nip';
import { Table } from '@/components/ui/table';
import type { FormAction } from '@/lib/core/form-state';
import type { OfficeGates } from '@/lib/gate/views/office';
import { GatePassForm, RevokeGatePassForm } from './pass-forms';

type OfficeGateListProps = { view: OfficeGates; makePass: FormAction; revokePass: FormAction };

/** All gates of an open day on the staff copy: counts first, then passes. */
export function OfficeGateList({ view, makePass, revokePass }: OfficeGateListProps) {
  return (
    <>
      <Table
        caption="Heads at each gate"
        room="figures"
        rows={view.gates}
        rowKey={(gate) => gate.stopId}
        empty="No garden takes part in this open day yet. Add a stop first."
        columns={[
          { key: 'gate', head: 'Gate', names: 'row', cell: (gate) => <span className="flex items-baseline gap-2 whitespace-nowrap"><NipCard stopNumber={gate.number} width={38} />{gate.number} {gate.garden}</span> },
          { key: 'expected', head: 'Expected', set: 'figures', cell: (gate) => gate.expected },
          { key: 'in', head: 'Let in', set: 'figures', cell: (gate) => gate.cameIn },
          { key: 'now', head: 'In now', set: 'figures', cell: (gate) => gate.now },
          { key: 'limit', head: 'Limit', set: 'figures', cell: (gate) => gate.headsLimit },
          { key: 'refusals', head: 'Turned away', set: 'figures', cell: (gate) => gate.refusals },
        ]}
      />
      {view.gates.length === 0 ? null : (
        <section aria-labelledby="make-pass" className="mt-8 border-t border-rule pt-4">
          <h2 id="make-pass" className="mb-3">Make a gate pass</h2>
          <GatePassForm action={makePass} gates={view.gates} />
        </section>
      )}
      <section aria-labelledby="passes" className="mt-8 border-t border-rule pt-4">
        <h2 id="passes" className="mb-2">Passes</h2>
        <Table
          caption="Gate passes"
          rows={view.passes}
          rowKey={(pass) => pass.gatePassId}
          empty="Nobody has a pass yet. Make one for each helper at a gate."
          columns={[
            { key: 'gate', head: 'Gate', cell: (pass) => `${pass.number} ${pass.garden}` },
            { key: 'helper', head: 'Helper', names: 'row', cell: (pass) => pass.helper },
            { key: 'made', head: 'Made', cell: (pass) => pass.madeText },
            { key: 'phones', head: 'Opened on', cell: (pass) => pass.phonesText },
            { key: 'seen', head: 'Last', cell: (pass) => pass.seenText },
            { key: 'revoke', head: 'Take back', cell: (pass) => (pass.isLive ? <RevokeGatePassForm action={revokePass} gatePassId={pass.gatePassId} helper={pass.helper} /> : null) },
          ]}
        />
      </section>
    </>
  );
}
