// What the pages need of the browser besides drawing: the name of the person at this device.
const key = "tankchem-who";

export function rememberedName() {
  try {
    return localStorage.getItem(key) ?? "";
  } catch {
    // Storage is switched off in this browser; the name is then asked for each time.
    return "";
  }
}

export function rememberName(name) {
  try {
    localStorage.setItem(key, name);
  } catch {
    return;
  }
}

export function printPage() {
  window.print();
}
