import { redirect } from "next/navigation";
import { pageContext } from "@/lib/http/page";

/** A project opens on its plan. */
export default async function ProjectPage({
  params,
}: {
  params: Promise<{ project: string }>;
}): Promise<never> {
  const { projectId } = await pageContext((await params).project);
  redirect(`/projects/${projectId}/plan`);
}
