import "next-auth/jwt";

declare module "next-auth/jwt" {
  interface JWT {
    /** Id of the row in `sessions`: all that the cookie says. */
    sid?: string;
  }
}
