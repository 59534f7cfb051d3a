import { redirect } from "next/navigation";

/** The register begins with the list of the own projects. */
export default function StartPage(): never {
  redirect("/projects");
}
