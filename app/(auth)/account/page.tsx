import type { Metadata } from "next";
import Link from "next/link";
import { CertificateTable } from "@/components/certificates/CertificateTable";
import { formatInstant } from "@/components/ui/formatDay";
import { SectionHead } from "@/components/ui/SectionHead";
import { SubmitKey } from "@/components/ui/SubmitKey";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { signOutAction } from "@/lib/auth/actions";
import { requirePerson } from "@/lib/auth/requirePerson";
import { listOwnCertificates } from "@/lib/queries/listCertificates";
import { getAccount, type AccountView } from "@/lib/queries/getAccount";
import { EndSession } from "./_components/EndSession";
import { NameForm } from "./_components/NameForm";
import { SetPasswordForm } from "./_components/SetPasswordForm";
import { endSessionAction, renamePersonAction, setPasswordAction } from "./actions";

export const metadata: Metadata = { title: "Account" };

export default async function AccountPage() {
  const person = await requirePerson();
  const [account, certificates] = await Promise.all([getAccount(person, new Date()), listOwnCertificates(person)]);
  return (
    <div className="page py-8 desk:py-10">
      <div className="flex flex-wrap items-end justify-between gap-4">
        <div>
          <h1 className="text-h1">{account.name}</h1>
          <p className="mt-1 text-ink-2">{account.email}</p>
          {person.isOperator && (
            <p className="mt-2">
              <Link className="link" href="/operator/stopped-jobs">
                Stopped jobs
              </Link>
            </p>
          )}
        </div>
        <form action={signOutAction}>
          <SubmitKey variant="plain">Sign out</SubmitKey>
        </form>
      </div>
      <div className="mt-8 grid gap-x-(--gutter) gap-y-10 desk:grid-cols-[7fr_5fr]">
        <div className="grid content-start gap-10">
          <Employers employers={account.employers} />
          {certificates.length > 0 && (
            <section aria-labelledby="certificates">
              <SectionHead title="Certificates" id="certificates" note="yours for life, whoever employs you" />
              <CertificateTable
                rows={certificates}
                base="/verify"
                fileOf={(number) => `/api/account/certificates/${number}/pdf`}
              />
            </section>
          )}
          <Sessions sessions={account.sessions} />
        </div>
        <div className="grid content-start gap-10">
          <section aria-labelledby="name">
            <SectionHead title="Name" id="name" note="as it stands on new certificates" />
            <NameForm name={account.name} action={renamePersonAction} />
          </section>
          <section aria-labelledby="password">
            <SectionHead title="Password" id="password" note="needed to sign decisions" />
            <SetPasswordForm
              email={account.email}
              asksPresent={account.needsPresentPassword}
              isFirst={!account.hasPassword}
              action={setPasswordAction}
            />
          </section>
        </div>
      </div>
    </div>
  );
}

function Employers({ employers }: Pick<AccountView, "employers">) {
  return (
    <section aria-labelledby="employers">
      <SectionHead title="Employers" id="employers" />
      {employers.length === 0 ? (
        <p className="mt-3 max-w-measure">
          You hold no role at any employer. An administrator of your firm can grant you one.
        </p>
      ) : (
        <Table reflow caption="Employers at which you hold a role">
          <thead>
            <tr>
              <Th>Employer</Th>
              <Th>Roles</Th>
            </tr>
          </thead>
          <tbody>
            {employers.map((employer) => (
              <Tr key={employer.slug}>
                <RowHead>
                  <Link href={employer.home} className="link">
                    {employer.name}
                  </Link>
                </RowHead>
                <Td label="Roles">{employer.roles.join(", ")}</Td>
              </Tr>
            ))}
          </tbody>
        </Table>
      )}
    </section>
  );
}

function Sessions({ sessions }: Pick<AccountView, "sessions">) {
  return (
    <section aria-labelledby="sessions">
      <SectionHead title="Sessions" id="sessions" note="an ended session is refused at its next request" />
      <Table reflow caption="Your sessions">
        <thead>
          <tr>
            <Th>Started</Th>
            <Th>By</Th>
            <Th>Ends</Th>
            <Th />
          </tr>
        </thead>
        <tbody>
          {sessions.map((session) => (
            <Tr key={session.id} wash={session.isThis ? "plus" : null}>
              <RowHead>{formatInstant(session.startedAt)}</RowHead>
              <Td label="By">{session.passwordAt ? "password" : "mailed link"}</Td>
              <Td label="Ends">{formatInstant(session.endsAt)}</Td>
              <Td>
                {session.isThis ? "this session" : <EndSession sessionId={session.id} action={endSessionAction} />}
              </Td>
            </Tr>
          ))}
        </tbody>
      </Table>
    </section>
  );
}
