'use client';

import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import Link from 'next/link';
import { Notice } from '@/components/layout/notices';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { ReportBody } from '@/components/reports/reading/report-body';
import { ReportFacts } from '@/components/reports/reading/report-facts';
import { Button, LinkButton } from '@/components/ui/button';
import { Dialog, DialogClose } from '@/components/ui/dialog';
import { Skeleton } from '@/components/ui/skeleton';
import { callApi } from '@/lib/platform/http/call-api';
import { reportView, STATE_WORDS, type ReportView } from '@/lib/reports/schema';

const NEXT: Partial<Record<ReportView['state'], string>> = {
  submitted: 'A moderator will look at it; you hear by mail what comes of it. New members’ reports come first.',
  'changes-requested': 'The remarks below say what to change. Measure again with them in mind, and send a new report.',
  verified: 'It counts in the published figures of its device and category.',
  declined: 'The reason stands below. A new measurement is welcome.',
  withdrawn: 'You took it back; it counts nowhere any more.',
};

/** One's own report in its newest revision, with what comes next. */
export function MyReport({ publicId }: { publicId: string }) {
  const client = useQueryClient();
  const key = ['report', publicId, 'newest'];
  const { data: report, error } = useQuery({
    queryKey: key,
    queryFn: () => callApi(`/api/v1/reports/${publicId}?revision=newest`, { answer: reportView }),
  });
  const withdraw = useMutation({
    mutationFn: () => callApi(`/api/v1/reports/${publicId}/withdrawal`, { method: 'POST', body: {} }),
    onSuccess: () => client.invalidateQueries({ queryKey: key }),
  });
  if (error) {
    return (
      <Sheet head={<PageTitle>Report</PageTitle>}>
        <Notice tone="warning" role="alert" title="This report can’t be shown">
          {error.message}
        </Notice>
      </Sheet>
    );
  }
  if (!report) {
    return (
      <Sheet head={<PageTitle>Report</PageTitle>}>
        <Skeleton label="Loading the report" lines={6} />
      </Sheet>
    );
  }
  const mayWithdraw = ['submitted', 'second-review', 'changes-requested', 'verified'].includes(report.state);
  return (
    <Sheet
      head={<PageTitle lead={NEXT[report.state]}>{report.device.name}</PageTitle>}
      margin={<ReportFacts report={report} />}
    >
      <p role="status" className="mt-6 font-semibold first-letter:uppercase">
        {STATE_WORDS[report.state]}
      </p>
      <p className="mt-3 flex flex-wrap items-center gap-5">
        {report.state === 'verified' && (
          <Link href={`/devices/${report.device.slug}`} className="text-lichen underline underline-offset-4">
            See what it changed
          </Link>
        )}
        {(report.state === 'changes-requested' || report.state === 'declined') && (
          <LinkButton look="main" href={`/reports/new?device=${report.device.publicId}`}>
            Measure again
          </LinkButton>
        )}
        {mayWithdraw && (
          <Dialog
            title="Withdraw this report?"
            description="It stays on the record, but counts in no figure any more. This can’t be undone."
            trigger={<Button>Withdraw</Button>}
          >
            <p className="flex flex-wrap gap-4">
              <DialogClose asChild>
                <Button>Keep it</Button>
              </DialogClose>
              <Button look="warning" busy={withdraw.isPending} onClick={() => withdraw.mutate()}>
                Withdraw it
              </Button>
            </p>
            {withdraw.isError && <p className="mt-3 text-rust">{withdraw.error.message}</p>}
          </Dialog>
        )}
      </p>
      <ReportBody report={report} />
    </Sheet>
  );
}
