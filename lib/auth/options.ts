import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { appDatabase } from "@/db/client";
import { signIn } from "./sign-in";
import { readOrigin } from "./throttle";

declare module "next-auth" {
  interface Session {
    userId: string;
    teamId: string;
  }
  interface User {
    teamId: string;
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    userId: string;
    teamId: string;
  }
}

export const authOptions: NextAuthOptions = {
  session: { strategy: "jwt", maxAge: 12 * 60 * 60 },
  pages: { signIn: "/sign-in" },
  providers: [
    CredentialsProvider({
      name: "E-mail and password",
      credentials: { email: { type: "email" }, password: { type: "password" } },
      async authorize(credentials, request) {
        if (!credentials?.email || !credentials.password) return null;
        const origin = readOrigin(request.headers?.["x-forwarded-for"]);
        // What signIn throws when there were too many tries reaches the form by its message.
        const found = await signIn(appDatabase(), credentials.email, credentials.password, origin);
        if (!found) return null;
        return { id: found.userId, teamId: found.teamId, name: found.name, email: found.email };
      },
    }),
  ],
  callbacks: {
    jwt({ token, user }) {
      if (user) {
        token.userId = user.id;
        token.teamId = user.teamId;
      }
      return token;
    },
    session({ session, token }) {
      session.userId = token.userId;
      session.teamId = token.teamId;
      return session;
    },
  },
};
