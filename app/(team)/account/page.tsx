import type { Metadata } from "next";
import { OwnPasswordForm } from "@/components/team/own-password-form";
import { Facts } from "@/components/ui/facts";
import { PageHead } from "@/components/ui/page-head";
import { Section } from "@/components/ui/section";
import { currentMember } from "@/lib/auth/session";
import { storeOwnPassword } from "./actions";

export const metadata: Metadata = { title: "Account" };

export default async function AccountPage() {
  const { member } = await currentMember();
  return (
    <>
      <PageHead title="Account" />
      <Facts
        items={[
          { label: "Name", value: member.name },
          { label: "E-mail", value: member.email },
          { label: "Team", value: member.teamName },
          { label: "Role", value: member.role },
        ]}
      />
      <Section
        title="Change your password"
        lead="Other browsers where you are signed in stay so until you sign out there or their session ends."
      >
        <OwnPasswordForm email={member.email} action={storeOwnPassword} />
      </Section>
    </>
  );
}
