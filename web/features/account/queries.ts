import { useMutation } from "@tanstack/react-query";
import {
  acknowledgementSchema,
  type ChangePasswordRequest,
  type ForgotRequest,
  type RegisterRequest,
  type ResetRequest,
  type SignInRequest,
  type VerifyRequest,
} from "#shared/contracts/account.ts";
import { api, nothing } from "#web/lib/api.ts";
import { useRefreshSession, useStartAnew } from "#web/lib/session.ts";

export function useRegister() {
  return useMutation({
    mutationFn: (request: RegisterRequest) =>
      api.post("/api/account/register", request, acknowledgementSchema),
  });
}

export function useVerify() {
  const refreshSession = useRefreshSession();
  return useMutation({
    mutationFn: (request: VerifyRequest) => api.post("/api/account/verify", request, nothing),
    onSuccess: () => refreshSession(),
  });
}

export function useResendVerification() {
  return useMutation({
    mutationFn: () => api.post("/api/account/resend-verification", undefined, nothing),
  });
}

export function useSignIn() {
  const startAnew = useStartAnew();
  return useMutation({
    mutationFn: async (request: SignInRequest) => {
      await api.post("/api/account/sign-in", request, nothing);
      await startAnew();
    },
  });
}

export function useSignOut() {
  const startAnew = useStartAnew();
  return useMutation({
    mutationFn: async () => {
      await api.post("/api/account/sign-out", undefined, nothing);
      await startAnew();
    },
  });
}

export function useForgot() {
  return useMutation({
    mutationFn: (request: ForgotRequest) => api.post("/api/account/forgot", request, acknowledgementSchema),
  });
}

/** Ends every session of the person, so whoever is here is signed out too. */
export function useReset() {
  const startAnew = useStartAnew();
  return useMutation({
    mutationFn: async (request: ResetRequest) => {
      await api.post("/api/account/reset", request, nothing);
      await startAnew();
    },
  });
}

export function useChangePassword() {
  const startAnew = useStartAnew();
  return useMutation({
    mutationFn: async (request: ChangePasswordRequest) => {
      await api.post("/api/account/change-password", request, nothing);
      await startAnew();
    },
  });
}
