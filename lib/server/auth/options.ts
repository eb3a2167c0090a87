import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { endSession } from "@/lib/data/people/sessions";
import { signIn } from "@/lib/data/people/sign-in";
import { environment } from "@/lib/server/environment";
import { callerAddress } from "./caller-address";

const TWELVE_HOURS = 12 * 60 * 60;

/** The cookie holds only the session's id; who that is and what they may do is read from the database each time. */
export const authOptions: NextAuthOptions = {
  session: { strategy: "jwt", maxAge: TWELVE_HOURS },
  pages: { signIn: "/sign-in", error: "/sign-in" },
  providers: [
    CredentialsProvider({
      name: "E-mail and password",
      credentials: { email: { type: "email" }, password: { type: "password" } },
      async authorize(credentials, request) {
        const answer = await signIn({
          email: String(credentials?.email ?? ""),
          password: String(credentials?.password ?? ""),
          address: callerAddress(request.headers ?? {}, environment().TRUSTED_PROXY === "1"),
          device: String(request.headers?.["user-agent"] ?? "").slice(0, 200),
        });
        if (!answer.ok) throw new Error(answer.fault.code);
        return { id: String(answer.value.personId), name: answer.value.name, sessionId: answer.value.sessionId };
      },
    }),
  ],
  callbacks: {
    jwt({ token, user }) {
      if (user?.sessionId) token.sessionId = user.sessionId;
      return token;
    },
    session({ session, token }) {
      return { ...session, sessionId: token.sessionId };
    },
  },
  events: {
    async signOut({ token }) {
      if (token?.sessionId) await endSession(token.sessionId);
    },
  },
};
