import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { connection } from 'next/server';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { Table, Td, Th, Tr } from '@/components/ui/table';
import { runsAsDemonstration } from '@/lib/platform/env';
import { DEMONSTRATION_ACCOUNTS } from '@/lib/platform/demonstration-accounts';

export const metadata: Metadata = { title: 'Accounts of the demonstration', robots: 'noindex' };

/** Only the demonstration has this page: its passwords are public by intent. */
export default async function DemonstrationAccountsPage() {
  await connection();
  if (!runsAsDemonstration()) notFound();
  return (
    <Sheet
      head={
        <PageTitle lead="Sign in as anybody of the invented island and try what they may do.">
          Accounts of the demonstration
        </PageTitle>
      }
    >
      <Table caption="Accounts with their passwords" className="mt-6">
        <thead>
          <tr>
            <Th>name</Th>
            <Th>role</Th>
            <Th>e-mail address</Th>
            <Th>password</Th>
          </tr>
        </thead>
        <tbody>
          {DEMONSTRATION_ACCOUNTS.map((account) => (
            <Tr key={account.key}>
              <Td>{account.name}</Td>
              <Td>{account.role}</Td>
              <Td className="font-mono">{account.email}</Td>
              <Td className="font-mono">{account.password}</Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </Sheet>
  );
}
