'use client';

import { ActionForm } from '@/components/forms/action-form';
import { Input } from '@/components/ui/input';
import { Select } from '@/components/ui/select';
import type { FormAction } from '@/lib/core/form-state';
import { recordPaymentInput } from '@/lib/dues/schema';
import { Row } from './row';

const METHODS = [{ value: 'cheque', label: 'a cheque' }, { value: 'cash', label: 'cash' }, { value: 'transfer', label: 'a bank transfer' }];

/** Records a cheque, cash or a transfer for one term of one household. */
export function RecordPaymentForm({ action, chargeId, amount, today }: { action: FormAction; chargeId: string; amount: string; today: string }) {
  return (
    <ActionForm action={action} schema={recordPaymentInput} submit="Record it and write the receipt">
      <input type="hidden" name="chargeId" value={chargeId} />
      <Row>
        <Select name="method" label="It came as" choices={METHODS} width="half" />
        <Input name="amount" label="Amount" inputMode="decimal" defaultValue={amount} width="short" required />
        <Input name="receivedOn" label="Received on" type="date" defaultValue={today} width="short" required />
      </Row>
      <Input name="reference" label="Reference" hint="A cheque’s number, the bank’s words. May stay empty." />
    </ActionForm>
  );
}
