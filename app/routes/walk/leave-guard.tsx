import { useEffect } from "react";
import { useBlocker } from "react-router";
import { walkText } from "~/text/en/walk";
import { Button } from "~/ui/button";
import { AlertDialog } from "~/ui/dialog";

/** While `on`, nobody leaves the page, the tab or the window without being asked. */
export function LeaveGuard({ on }: { on: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation: here, nextLocation: there }) =>
      on && (here.pathname !== there.pathname || here.search !== there.search),
  );
  useEffect(() => {
    if (!on) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [on]);
  return (
    <AlertDialog
      open={blocker.state === "blocked"}
      onClose={() => blocker.reset?.()}
      title={walkText.leave.title}
      actions={
        <>
          <Button kind="main" onClick={() => blocker.reset?.()}>
            {walkText.leave.stay}
          </Button>
          <Button kind="danger" onClick={() => blocker.proceed?.()}>
            {walkText.leave.go}
          </Button>
        </>
      }
    >
      <p>{walkText.leave.text}</p>
    </AlertDialog>
  );
}
