/** Sign-in, sign-out and the session, through next-auth. */
export { authGet as GET, authPost as POST } from "@/lib/http/auth-route";
