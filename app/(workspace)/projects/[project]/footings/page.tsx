import type { Metadata } from "next";
import { FootingsSheet } from "@/components/footings/footings-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { Invalid } from "@/lib/services/errors";
import { footingChoices } from "@/lib/services/footings/footing-choices";
import { listFootings } from "@/lib/services/footings/list-footings";

export const metadata: Metadata = { title: "Footings · Holdground" };

type Props = {
  params: Promise<{ project: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
};

/** The schedule of footings, narrowed to what the address says. */
export default async function FootingsPage({ params, searchParams }: Props) {
  const context = await pageContext((await params).project);
  const asked = Object.fromEntries(
    Object.entries(await searchParams).filter(
      (entry): entry is [string, string] => typeof entry[1] === "string",
    ),
  );
  // An address that was mistyped shows the whole schedule rather than nothing.
  const [filter, first] = await listFootings(context, asked).then(
    (list) => [asked, list] as const,
    async (error: unknown) => {
      if (!(error instanceof Invalid)) throw error;
      return [{}, await listFootings(context, {})] as const;
    },
  );
  const choices = await footingChoices(context);
  return (
    <FootingsSheet
      projectId={context.projectId}
      first={first}
      firstFilter={filter}
      choices={choices}
      may={{
        write: may(context.roles, "footing:write"),
        link: may(context.roles, "footing:link"),
        check: may(context.roles, "check:run"),
      }}
    />
  );
}
