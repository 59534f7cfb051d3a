import NextAuth from "next-auth";
import { authOptions } from "@/lib/http/session";

const handler = (request: Request, context: { params: Promise<{ nextauth: string[] }> }) =>
  NextAuth(request as never, context as never, authOptions());

export { handler as GET, handler as POST };
