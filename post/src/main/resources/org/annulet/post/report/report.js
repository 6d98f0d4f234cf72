"use strict";
(() => {
  const data = JSON.parse(document.getElementById("fields").textContent);
  const bytes = (text) => Uint8Array.from(atob(text), (c) => c.charCodeAt(0)).buffer;
  const points = new Float32Array(bytes(data.points));
  const triangles = new Int32Array(bytes(data.triangles));
  const count = points.length / 2;
  const outline = new Path2D(data.outline);
  const fields = [];
  const fieldOf = (i) => (fields[i] ??= new Int16Array(bytes(data.modes[i].field)));
  const maps = new Map();
  const dark = window.matchMedia("(prefers-color-scheme: dark)");
  let palette = null;
  let printing = false; // paper is light whatever the screen is

  // 256 colours from suction (blue-green) over paper to pressure (copper).
  function colours() {
    const stops = dark.matches && !printing
      ? [[126, 214, 214], [34, 122, 134], [30, 32, 36], [178, 84, 36], [250, 186, 130]]
      : [[8, 64, 80], [60, 150, 160], [247, 244, 238], [214, 120, 66], [122, 38, 8]];
    const out = new Uint32Array(256);
    for (let i = 0; i < 256; i++) {
      const at = (i / 255) * 4;
      const k = Math.min(3, Math.floor(at));
      const c = [0, 1, 2].map((j) => Math.round(stops[k][j] + (at - k) * (stops[k + 1][j] - stops[k][j])));
      out[i] = (255 << 24) | (c[2] << 16) | (c[1] << 8) | c[0];
    }
    return out;
  }

  // For a canvas of w px: which corners and weights each pixel inside the chamber takes.
  function pixelMap(w, h) {
    const key = w + "x" + h;
    if (maps.has(key)) return maps.get(key);
    const scale = w / data.size[0];
    const corner = new Int32Array(w * h).fill(-1);
    const one = new Float32Array(w * h);
    const two = new Float32Array(w * h);
    for (let t = 0; t < triangles.length; t += 3) {
      const [a, b, c] = [triangles[t], triangles[t + 1], triangles[t + 2]];
      const x0 = points[2 * a] * scale, y0 = points[2 * a + 1] * scale;
      const x1 = points[2 * b] * scale - x0, y1 = points[2 * b + 1] * scale - y0;
      const x2 = points[2 * c] * scale - x0, y2 = points[2 * c + 1] * scale - y0;
      const twice = x1 * y2 - x2 * y1;
      if (twice === 0) continue;
      const left = Math.max(0, Math.floor(x0 + Math.min(0, x1, x2)));
      const right = Math.min(w - 1, Math.ceil(x0 + Math.max(0, x1, x2)));
      const top = Math.max(0, Math.floor(y0 + Math.min(0, y1, y2)));
      const bottom = Math.min(h - 1, Math.ceil(y0 + Math.max(0, y1, y2)));
      for (let y = top; y <= bottom; y++) {
        for (let x = left; x <= right; x++) {
          const dx = x + 0.5 - x0, dy = y + 0.5 - y0;
          const l1 = (dx * y2 - x2 * dy) / twice, l2 = (x1 * dy - dx * y1) / twice;
          if (l1 >= -1e-6 && l2 >= -1e-6 && l1 + l2 <= 1 + 1e-6) {
            const p = y * w + x;
            corner[p] = t;
            one[p] = l1;
            two[p] = l2;
          }
        }
      }
    }
    const inside = [];
    for (let p = 0; p < corner.length; p++) if (corner[p] >= 0) inside.push(p);
    const map = { corner, one, two, inside: Int32Array.from(inside) };
    maps.set(key, map);
    return map;
  }

  // Sides that belong to one triangle: the walls, for maps that live on walls only.
  const walls = (() => {
    const seen = new Map();
    for (let t = 0; t < triangles.length; t += 3) {
      for (let k = 0; k < 3; k++) {
        const a = triangles[t + k], b = triangles[t + (k + 1) % 3];
        const key = Math.min(a, b) * count + Math.max(a, b);
        if (seen.has(key)) seen.delete(key); else seen.set(key, [a, b]);
      }
    }
    return [...seen.values()];
  })();
  const shade = (f) => Math.max(0, Math.min(255, Math.round(127.5 + 127.5 * f)));
  const css = (i) => "rgb(" + [0, 8, 16].map((s) => (palette[i] >> s) & 255).join(",") + ")";
  // A map between -1 and 1 at the points.
  const mapOf = (m) => (m.values ??= Float32Array.from(new Int16Array(bytes(m.field)), (v) => v / 32767));

  class Picture {
    constructor(canvas) { this.canvas = canvas; }

    size() {
      const wide = this.canvas.clientWidth;
      if (!wide) return false;
      const w = Math.min(1100, Math.round(wide * Math.min(1.5, window.devicePixelRatio || 1)));
      const h = Math.max(1, Math.round((w * data.size[1]) / data.size[0]));
      if (this.canvas.width !== w || this.canvas.height !== h || !this.image) {
        this.canvas.width = w;
        this.canvas.height = h;
        this.image = new ImageData(w, h);
        this.pixels = new Uint32Array(this.image.data.buffer);
      }
      this.map = pixelMap(w, h);
      return true;
    }

    // Colours between -1 and 1 over the gas, along the walls only, or as spots where a thin flame is.
    paint(v, how) {
      const alongWalls = how === "walls";
      palette ??= colours();
      const { corner, one, two, inside } = this.map;
      for (let q = 0; q < inside.length; q++) {
        const p = inside[q], t = corner[p];
        const a = v[triangles[t]];
        const f = a + one[p] * (v[triangles[t + 1]] - a) + two[p] * (v[triangles[t + 2]] - a);
        this.pixels[p] = palette[alongWalls ? 128 : shade(f)];
      }
      const g = this.canvas.getContext("2d");
      g.putImageData(this.image, 0, 0);
      const scale = this.canvas.width / data.size[0];
      g.setTransform(scale, 0, 0, scale, 0, 0);
      g.strokeStyle = printing ? "#23252a" : getComputedStyle(this.canvas).color;
      g.lineWidth = 1.1;
      g.stroke(outline);
      if (alongWalls) {
        const ink = g.strokeStyle;
        g.lineCap = "round";
        for (const width of [9, 6.5]) { // a rim of ink, so that walls without effect still show
          g.lineWidth = width;
          for (const [a, b] of walls) {
            g.strokeStyle = width > 7 ? ink : css(shade((v[a] + v[b]) / 2));
            g.beginPath();
            g.moveTo(points[2 * a], points[2 * a + 1]);
            g.lineTo(points[2 * b], points[2 * b + 1]);
            g.stroke();
          }
        }
        g.lineCap = "butt";
      }
      if (how === "spots") {
        for (let i = 0; i < count; i++) {
          if (Math.abs(v[i]) < 0.03) continue;
          g.fillStyle = css(shade(v[i]));
          g.beginPath();
          g.arc(points[2 * i], points[2 * i + 1], 4, 0, 2 * Math.PI);
          g.fill();
        }
      }
      g.setTransform(1, 0, 0, 1, 0, 0);
    }
  }

  // A map that stands still: the worst of several modes.
  class Still extends Picture {
    constructor(figure) {
      super(figure.querySelector("canvas"));
      this.playing = false;
    }

    draw() {
      if (this.size()) this.paint(mapOf(data.worst), data.worst.how);
    }

    toggle() {}
  }

  class Viewer extends Picture {
    constructor(article, index) {
      super(article.querySelector("canvas"));
      this.index = index;
      this.high = article.querySelector(".legend .high");
      this.low = article.querySelector(".legend .low");
      this.pressure = [this.low.textContent, this.high.textContent];
      this.phase = article.querySelector(".phase");
      this.slider = article.querySelector("input[type=range]");
      this.output = article.querySelector("output");
      this.button = article.querySelector("button");
      this.select = article.querySelector("select");
      this.playing = false;
      this.value = new Float32Array(count);
      this.mix();
      this.slider.addEventListener("input", () => this.draw());
      this.button.addEventListener("click", () => this.toggle());
      if (this.select) {
        const { combinations, maps } = data.modes[index];
        combinations.forEach((c, k) => this.select.add(new Option(c.name, k)));
        maps.forEach((m, k) => this.select.add(new Option(m.name, combinations.length + k)));
        this.select.closest(".which").hidden = combinations.length + maps.length === 0;
        this.select.addEventListener("change", () => { this.mix(); this.draw(); });
      }
    }

    // The complex field shown: the mode itself or a combination with its partner, largest value 1.
    mix() {
      const pick = this.select ? Number(this.select.value) : -1;
      const { combinations, maps } = data.modes[this.index];
      this.still = pick >= combinations.length ? maps[pick - combinations.length] : null;
      this.phase.hidden = this.still !== null;
      this.button.hidden = this.still !== null;
      [this.low.textContent, this.high.textContent] = this.still ? [this.still.low, this.still.high] : this.pressure;
      if (this.still) {
        if (this.playing) this.toggle();
        return;
      }
      const own = fieldOf(this.index);
      this.re = new Float32Array(count);
      this.im = new Float32Array(count);
      const combination = pick >= 0 ? combinations[pick] : null;
      const other = combination ? fieldOf(combination.partner) : own;
      const [ar, ai, br, bi] = combination ? combination.weights : [1, 0, 0, 0];
      let largest = 1e-30;
      for (let i = 0; i < count; i++) {
        const [pr, pi, qr, qi] = [own[i], own[count + i], other[i], other[count + i]];
        this.re[i] = ar * pr - ai * pi + br * qr - bi * qi;
        this.im[i] = ar * pi + ai * pr + br * qi + bi * qr;
        largest = Math.max(largest, Math.hypot(this.re[i], this.im[i]));
      }
      for (let i = 0; i < count; i++) { this.re[i] /= largest; this.im[i] /= largest; }
    }

    draw() {
      if (!this.size()) return;
      if (this.still) {
        this.paint(mapOf(this.still), this.still.how);
        return;
      }
      const phase = ((Number(this.slider.value) % 360) * Math.PI) / 180;
      const [c, s] = [Math.cos(phase), Math.sin(phase)];
      for (let i = 0; i < count; i++) this.value[i] = c * this.re[i] - s * this.im[i];
      this.paint(this.value, "gas");
      this.output.textContent = Math.round(Number(this.slider.value)) + "°";
    }

    toggle() {
      this.playing = !this.playing;
      this.button.textContent = this.playing ? "Pause" : "Play";
      this.button.setAttribute("aria-pressed", String(this.playing));
      let last = null;
      const step = (now) => {
        if (!this.playing) return;
        if (last !== null) {
          this.slider.value = (Number(this.slider.value) + ((now - last) * 360) / 2800) % 360;
          this.draw();
        }
        last = now;
        requestAnimationFrame(step);
      };
      if (this.playing) {
        viewers.forEach((o) => { if (o !== this && o.playing) o.toggle(); });
        requestAnimationFrame(step);
      }
    }
  }

  const articles = [...document.querySelectorAll("article.mode")];
  const viewers = articles.map((a, i) => new Viewer(a, i));
  const figure = document.querySelector("figure.worst");
  if (figure) {
    articles.push(figure);
    viewers.push(new Still(figure));
  }
  const seen = new IntersectionObserver((entries) => {
    entries.forEach((e) => { if (e.isIntersecting) viewers[articles.indexOf(e.target)].draw(); });
  }, { rootMargin: "300px" });
  articles.forEach((a) => seen.observe(a));
  const redraw = () => { palette = null; maps.clear(); viewers.forEach((v) => v.image && v.draw()); };
  let pending = 0;
  window.addEventListener("resize", () => { clearTimeout(pending); pending = setTimeout(redraw, 120); });
  dark.addEventListener("change", redraw);
  window.addEventListener("beforeprint", () => {
    printing = true;
    palette = null;
    viewers.forEach((v) => v.draw());
  });
  window.addEventListener("afterprint", () => { printing = false; redraw(); });
})();
