'use client';

import { useState } from 'react';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { TextField } from '@/app/_components/forms/text-field';
import { Button } from '@/app/_components/ui/button';
import type { Grid, Study } from '@/lib/domain/studies/schema';
import { useGridChange } from './use-grid-change';

interface LeaveOutProps { study: Study; grid: Grid; onClose: () => void }

/** A grid is left out for a reason, which is printed with the result. */
export function LeaveOut({ study, grid, onClose }: LeaveOutProps) {
  const [reason, setReason] = useState('');
  const [fault, setFault] = useState<string>();
  const { change, isChanging, problem } = useGridChange(study, 'Not left out');
  const submit = async () => {
    if (reason.trim() === '') {
      setFault('No reason. Say why the grid has no say, such as a mesh written wrongly.');
      return;
    }
    await change([{ grid, change: { exclude: reason.trim() } }]).then(onClose, () => undefined);
  };
  return (
    <form
      aria-label={`Leave grid ${grid.label} out`} noValidate className="max-w-[600px] pt-1 pb-2"
      onSubmit={(event) => { event.preventDefault(); void submit(); }}
    >
      <TextField
        label={`Reason for leaving grid ${grid.label} out, printed in the report`} value={reason} maxLength={500} error={fault} autoFocus
        onChange={(event) => { setReason(event.target.value); setFault(undefined); }}
      />
      <ProblemNotice problem={problem} />
      <div className="mt-3 flex flex-wrap gap-3">
        <Button type="submit" disabled={isChanging}>Leave grid {grid.label} out</Button>
        <Button onClick={onClose}>Keep it</Button>
      </div>
    </form>
  );
}
