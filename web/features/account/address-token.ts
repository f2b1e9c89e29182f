import { useEffect, useState } from "react";
import { useLocation, useNavigate } from "react-router-dom";

/**
 * The token that a mailed link brought, taken out of the address bar at once, so that it stays in no history and no
 * screenshot. Null when there is none, as after a reload.
 */
export function useAddressToken(): string | null {
  const { pathname, search } = useLocation();
  const navigate = useNavigate();
  const [token] = useState(() => new URLSearchParams(search).get("token"));
  useEffect(() => {
    if (new URLSearchParams(search).has("token")) void navigate(pathname, { replace: true });
  }, [navigate, pathname, search]);
  return token;
}
