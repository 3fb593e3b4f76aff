/* The steps of src/NetFault/Sparse in plain C, as a yardstick for the managed code: nodes of degree up to two, approximate minimum
 * degree for the rest, elimination tree, postorder, pattern of L, left-looking L*D*L^T, selected inverse. Same algorithms, no pivot
 * shifts. Written for the benchmark from the papers cited in docs/numerics.md.
 * nf_keep_memory stops malloc from giving pages back, so that C does not pay the kernel for them at every call.
 * gcc -O3 -march=native -shared -fPIC kernel.c -o kernel.so -lm */
#include <malloc.h>
#include <math.h>
#include <stdlib.h>
#include <string.h>

typedef struct { double re, im; } cplx;

static inline cplx mul(cplx a, cplx b) { return (cplx){a.re * b.re - a.im * b.im, a.re * b.im + a.im * b.re}; }
static inline cplx inv(cplx a) { double s = 1 / (a.re * a.re + a.im * a.im); return (cplx){a.re * s, -a.im * s}; }
static inline double size1(cplx a) { return fabs(a.re) + fabs(a.im); }
static int *ints(size_t n) { return malloc((n + 1) * sizeof(int)); }

void nf_keep_memory(void) { mallopt(M_MMAP_THRESHOLD, 1 << 30); mallopt(M_TRIM_THRESHOLD, 1 << 30); mallopt(M_TOP_PAD, 64 << 20); }

/* ---- graph: both directions of each slot ---- */
static void adjacency(int n, const int *cs, const int *ri, int *start, int *nb, int *slot) {
    int m = cs[n], sum = 0;
    memset(start, 0, (n + 1) * sizeof(int));
    for (int s = 0; s < m; s++) start[ri[s]]++;
    for (int i = 0; i < n; i++) { int d = start[i] + cs[i + 1] - cs[i]; start[i] = sum; sum += d; }
    for (int c = 0; c < n; c++)
        for (int s = cs[c]; s < cs[c + 1]; s++) {
            int r = ri[s];
            slot[start[r]] = s; nb[start[r]++] = c;
            slot[start[c]] = s; nb[start[c]++] = r;
        }
    memmove(start + 1, start, n * sizeof(int));
    start[0] = 0;
}

/* ---- degree 0, 1 and 2 ---- */
typedef struct { const int *start; int *nb, *deg, *pend, *link, *order; int np, lh, lt, done; } low;

static inline void low_queue(low *w, int v) {
    if (w->deg[v] == 2) w->link[w->lt++] = v;
    else if (w->deg[v] == 1) w->pend[w->np++] = v;
}
static inline int low_find(low *w, int a, int v) { int p = w->start[a]; while (w->nb[p] != v) p++; return p; }
static inline void low_cut(low *w, int a, int v) {
    int last = w->start[a] + --w->deg[a];
    w->nb[low_find(w, a, v)] = w->nb[last];
    low_queue(w, a);
}
static inline int low_joined(low *w, int a, int b) {
    int s = w->deg[a] <= w->deg[b] ? a : b, o = s == a ? b : a;
    for (int p = w->start[s], e = p + w->deg[s]; p < e; p++) if (w->nb[p] == o) return 1;
    return 0;
}
static int low_run(low *w, int n) {
    for (int v = 0; v < n; v++) { if (w->deg[v] == 0) w->pend[w->np++] = v; low_queue(w, v); }
    for (;;) {
        if (w->np > 0) {
            int v = w->pend[--w->np];
            if (w->deg[v] == 1) low_cut(w, w->nb[w->start[v]], v);
            w->deg[v] = -1; w->order[w->done++] = v;
        } else if (w->lh < w->lt) {
            int v = w->link[w->lh++];
            if (w->deg[v] != 2) continue;
            int a = w->nb[w->start[v]], b = w->nb[w->start[v] + 1];
            w->deg[v] = -1; w->order[w->done++] = v;
            if (low_joined(w, a, b)) { low_cut(w, a, v); low_cut(w, b, v); }
            else { w->nb[low_find(w, a, v)] = b; w->nb[low_find(w, b, v)] = a; }
        } else return w->done;
    }
}

/* ---- approximate minimum degree (Amestoy, Davis, Duff 1996) ---- */
typedef struct {
    int n, cap, free, stamp, gone, least;
    int *list, *start, *len, *ne, *size, *deg, *mark, *nextm, *lastm, *bucket, *nextb, *hash, *head, *next, *prev;
} quot;

static inline void q_insert(quot *g, int v, int d) {
    int f = g->head[d];
    g->next[v] = f; g->prev[v] = -1;
    if (f >= 0) g->prev[f] = v;
    g->head[d] = v;
    if (d < g->least) g->least = d;
}
static inline void q_remove(quot *g, int v, int d) {
    int a = g->next[v], b = g->prev[v];
    if (a >= 0) g->prev[a] = b;
    if (b >= 0) g->next[b] = a; else g->head[d] = a;
}
static void q_compress(quot *g) {
    for (int v = 0; v < g->n; v++) {
        int lives = g->ne[v] == -1 ? g->mark[v] != 0 : g->size[v] != 0;
        if (lives && g->len[v] > 0) { int f = g->start[v]; g->start[v] = g->list[f]; g->list[f] = ~v; }
    }
    int to = 0;
    for (int from = 0; from < g->free;) {
        int o = ~g->list[from++];
        if (o >= 0) {
            g->list[to] = g->start[o]; g->start[o] = to++;
            for (int r = g->len[o] - 1; r > 0; r--) g->list[to++] = g->list[from++];
        }
    }
    g->free = to;
}
static inline int q_join(quot *g, int pivot, int from, int count, int end) {
    for (int p = from; p < from + count; p++) {
        int i = g->list[p], s = g->size[i];
        if (s > 0) { g->size[i] = -s; g->deg[pivot] += s; q_remove(g, i, g->deg[i]); g->list[end++] = i; }
    }
    return end;
}
static inline void q_append(quot *g, int name, int merged) {
    g->size[merged] = 0; g->nextm[g->lastm[name]] = merged; g->lastm[name] = g->lastm[merged];
}
static void q_form(quot *g, int pivot) {
    int from = g->start[pivot], e = g->ne[pivot], vars = g->len[pivot] - e, begin = g->free, end = begin;
    g->size[pivot] = 0; g->deg[pivot] = 0;
    for (int p = from; p < from + e; p++) {
        int el = g->list[p];
        if (g->mark[el]) { end = q_join(g, pivot, g->start[el], g->len[el], end); g->mark[el] = 0; }
    }
    end = q_join(g, pivot, from + e, vars, end);
    g->free = end; g->start[pivot] = begin; g->len[pivot] = end - begin; g->ne[pivot] = -1; g->mark[pivot] = 1;
}
static void q_measure(quot *g, int pivot) {
    for (int p = g->start[pivot], end = p + g->len[pivot]; p < end; p++) {
        int i = g->list[p], s = -g->size[i];
        for (int q = g->start[i], last = q + g->ne[i]; q < last; q++) {
            int el = g->list[q];
            if (g->mark[el] >= g->stamp) g->mark[el] -= s;
            else if (g->mark[el]) g->mark[el] = g->deg[el] + g->stamp - s;
        }
    }
}
static void q_update(quot *g, int pivot) {
    for (int p = g->start[pivot], end = p + g->len[pivot]; p < end; p++) {
        int i = g->list[p], out = 0, kept = g->start[i], q = kept, qe = q + g->ne[i], qv = q + g->len[i];
        long sum = 0;
        for (; q < qe; q++) {
            int el = g->list[q], beyond = g->mark[el] - g->stamp;
            if (beyond > 0) { out += beyond; sum += el; g->list[kept++] = el; } else g->mark[el] = 0;
        }
        int split = kept;
        for (; q < qv; q++) {
            int j = g->list[q], s = g->size[j];
            if (s > 0) { out += s; sum += j; g->list[kept++] = j; }
        }
        if (kept == g->start[i]) { g->deg[pivot] += g->size[i]; g->gone -= g->size[i]; q_append(g, pivot, i); continue; }
        g->list[kept] = g->list[split]; g->list[split] = pivot;
        g->ne[i] = split + 1 - g->start[i]; g->len[i] = kept + 1 - g->start[i];
        if (out < g->deg[i]) g->deg[i] = out;
        int h = (int)(sum % g->n);
        g->hash[i] = h; g->nextb[i] = g->bucket[h]; g->bucket[h] = i;
    }
}
static void q_merge_later(quot *g, int i) {
    for (int q = g->start[i], e = q + g->len[i]; q < e; q++) g->mark[g->list[q]] = g->stamp;
    int previous = i;
    for (int j = g->nextb[i]; j >= 0; j = g->nextb[j]) {
        int same = g->len[i] == g->len[j] && g->ne[i] == g->ne[j];
        for (int q = g->start[j], e = q + g->len[j]; same && q < e; q++) same = g->mark[g->list[q]] == g->stamp;
        if (same) { g->size[i] += g->size[j]; q_append(g, i, j); g->nextb[previous] = g->nextb[j]; } else previous = j;
    }
    g->stamp++;
}
static void q_merge(quot *g, int pivot) {
    g->stamp += g->n + 1;
    for (int p = g->start[pivot], end = p + g->len[pivot]; p < end; p++) {
        int i = g->list[p];
        if (g->size[i] == 0) continue;
        int c = g->bucket[g->hash[i]];
        g->bucket[g->hash[i]] = -1;
        for (; c >= 0 && g->nextb[c] >= 0; c = g->nextb[c]) q_merge_later(g, c);
    }
}
static void q_restore(quot *g, int pivot) {
    int begin = g->start[pivot], kept = begin, left = g->n - g->gone;
    for (int p = begin, end = begin + g->len[pivot]; p < end; p++) {
        int i = g->list[p], s = -g->size[i];
        if (s > 0) {
            int d = g->deg[i] + g->deg[pivot] - s;
            g->size[i] = s; if (d > left - s) d = left - s;
            g->deg[i] = d; q_insert(g, i, d); g->list[kept++] = i;
        }
    }
    g->len[pivot] = kept - begin; g->free = kept; g->mark[pivot] = kept != begin;
    if (g->stamp < 0x7fffffff - 4 * (g->n + 1)) g->stamp += g->n + 1;
    else { for (int v = 0; v < g->n; v++) if (g->mark[v] > 1) g->mark[v] = 1; g->stamp = 2; }
}
static void order_core(int n, int core, const int *start, const int *nb, const int *deg, int *order) {
    int *name = ints(core), *nn = ints(n), found = 0, total = 0;
    for (int v = 0; v < n; v++) if (deg[v] >= 0) { name[found] = v; nn[v] = found++; total += deg[v]; }
    quot g = {.n = core, .cap = total + total / 5 + core + 1, .stamp = 2};
    int *w = ints(15 * (size_t)core + g.cap);
    int **at[] = {&g.start, &g.len, &g.ne, &g.size, &g.deg, &g.mark, &g.nextm, &g.lastm, &g.bucket, &g.nextb, &g.hash, &g.head, &g.next, &g.prev, &g.list};
    for (int k = 0; k < 15; k++) *at[k] = w + (size_t)k * core;
    for (int v = 0; v < core; v++) {
        int u = name[v];
        g.bucket[v] = g.head[v] = -1;
        g.start[v] = g.free; g.ne[v] = 0; g.size[v] = g.mark[v] = 1; g.nextm[v] = -1; g.lastm[v] = v;
        for (int p = start[u], e = p + deg[u]; p < e; p++) g.list[g.free++] = nn[nb[p]];
        g.len[v] = g.deg[v] = g.free - g.start[v];
    }
    for (int v = 0; v < core; v++) q_insert(&g, v, g.deg[v]);
    int *out = order;
    while (g.gone < core) {
        while (g.head[g.least] < 0) g.least++;
        int pivot = g.head[g.least];
        q_remove(&g, pivot, g.least);
        if (g.free + g.deg[pivot] > g.cap) q_compress(&g);
        g.gone += g.size[pivot];
        q_form(&g, pivot); q_measure(&g, pivot); q_update(&g, pivot); q_merge(&g, pivot); q_restore(&g, pivot);
        for (int m = pivot; m >= 0; m = g.nextm[m]) *out++ = name[m];
    }
    free(name); free(nn); free(w);
}
static void minimum_degree(int n, const int *start, int *nb, int *order) {
    int *deg = ints(n), *work = ints(2 * (size_t)n), dense = 0, limit = (int)fmax(16, 10 * sqrt(n));
    for (int v = 0; v < n; v++) {
        deg[v] = start[v + 1] - start[v];
        if (deg[v] > limit) { deg[v] = -1; order[n - ++dense] = v; }
    }
    for (int v = 0; dense > 0 && v < n; v++) {
        if (deg[v] < 0) continue;
        int kept = start[v];
        for (int p = kept, e = p + deg[v]; p < e; p++) if (deg[nb[p]] != -1) nb[kept++] = nb[p];
        deg[v] = kept - start[v];
    }
    low w = {.start = start, .nb = nb, .deg = deg, .pend = work, .link = work + n, .order = order};
    int done = low_run(&w, n), core = n - done - dense;
    if (core > 0) order_core(n, core, start, nb, deg, order + done);
    free(deg); free(work);
}

/* ---- elimination tree, postorder, pattern of L ---- */
static void postorder(int n, const int *parent, int *order) {
    int *child = ints(n), *sib = ints(n), root = -1, k = 0;
    memset(child, -1, n * sizeof(int));
    for (int j = n - 1; j >= 0; j--) {
        int u = parent[j];
        if (u < 0) { sib[j] = root; root = j; } else { sib[j] = child[u]; child[u] = j; }
    }
    for (int j = root; k < n;) {
        while (child[j] >= 0) j = child[j];
        for (;;) {
            order[k++] = j;
            if (sib[j] >= 0) { j = sib[j]; break; }
            j = parent[j];
            if (j < 0) break;
        }
    }
    free(child); free(sib);
}

/* Everything from the pattern to the inverse; zd: diagonal, zo: by slot. Returns the entries of L. */
int nf_kernel(int n, const int *cs, const int *ri, const cplx *diag, const cplx *off, cplx *zd, cplx *zo) {
    int m = cs[n];
    int *start = ints(n + 1), *nb = ints(2 * (size_t)m), *slot = ints(2 * (size_t)m), *copy = ints(2 * (size_t)m), *order = ints(n);
    int *place = ints(n), *parent = ints(n), *count = ints(n), *seen = ints(n), *post = ints(n), *back = ints(n), *node = ints(n);
    int *up = ints(n), *cols = ints(n + 1), *next = ints(n), *pos = ints(m);
    adjacency(n, cs, ri, start, nb, slot);
    memcpy(copy, nb, 2 * (size_t)m * sizeof(int));
    minimum_degree(n, start, copy, order);
    for (int k = 0; k < n; k++) place[order[k]] = k;
    for (int k = 0; k < n; k++) {
        parent[k] = -1; count[k] = 0; seen[k] = k;
        for (int v = order[k], p = start[v]; p < start[v + 1]; p++)
            for (int i = place[nb[p]]; i < k && seen[i] != k; i = parent[i]) {
                if (parent[i] < 0) parent[i] = k;
                count[i]++; seen[i] = k;
            }
    }
    postorder(n, parent, post);
    for (int k = 0; k < n; k++) back[post[k]] = k;
    cols[0] = 0;
    for (int k = 0; k < n; k++) {
        int o = post[k];
        node[k] = order[o]; place[order[o]] = k; up[k] = parent[o] < 0 ? -1 : back[parent[o]]; cols[k + 1] = cols[k] + count[o];
        next[k] = cols[k]; seen[k] = -1;
    }
    int lnz = cols[n], *rows = ints(lnz);
    for (int k = 0; k < n; k++) {
        seen[k] = k;
        for (int v = node[k], p = start[v]; p < start[v + 1]; p++)
            for (int i = place[nb[p]]; i < k && seen[i] != k; i = up[i]) { rows[next[i]++] = k; seen[i] = k; }
    }
    for (int j = 0; j < n; j++) {
        for (int p = cols[j]; p < cols[j + 1]; p++) count[rows[p]] = p;
        for (int v = node[j], p = start[v]; p < start[v + 1]; p++)
            if (place[nb[p]] > j) pos[slot[p]] = count[place[nb[p]]];
    }

    /* ---- numeric, left-looking ---- */
    cplx *l = calloc(lnz + 1, sizeof(cplx)), *d = malloc((n + 1) * sizeof(cplx)), *piv = malloc((n + 1) * sizeof(cplx));
    cplx *y = calloc(n + 1, sizeof(cplx)), *z = malloc((lnz + 1) * sizeof(cplx));
    double *err = malloc((n + 1) * sizeof(double));
    int *head = seen, *link = next, *cur = count;
    double worst = 0;
    for (int s = 0; s < m; s++) l[pos[s]] = off[s];
    memset(head, -1, n * sizeof(int));
    for (int j = 0; j < n; j++) {
        cplx a = diag[node[j]];
        double mag = size1(a), max = 0, e0 = 0;
        for (int p = cols[j]; p < cols[j + 1]; p++) y[rows[p]] = l[p];
        for (int k = head[j], after; k >= 0; k = after) {
            after = link[k];
            int p = cur[k], e = cols[k + 1];
            cplx f = mul(l[p], piv[k]), t = mul(l[p], f);
            a.re -= t.re; a.im -= t.im; mag += size1(t); e0 += (l[p].re * l[p].re + l[p].im * l[p].im) * err[k];
            if (++p < e) { int r = rows[p]; cur[k] = p; link[k] = head[r]; head[r] = k; }
            for (; p < e; p++) { cplx u = mul(l[p], f), *q = y + rows[p]; q->re -= u.re; q->im -= u.im; }
        }
        for (int p = cols[j]; p < cols[j + 1]; p++) { l[p] = y[rows[p]]; max = fmax(max, size1(l[p])); }
        err[j] = e0 + mag;
        if (!(size1(a) > 1e-2 * max && size1(a) > 1e-10 * mag && size1(a) > 1.1e-13 * err[j])) worst = 1;
        piv[j] = a; d[j] = inv(a);
        if (cols[j] < cols[j + 1]) { int r = rows[cols[j]]; cur[j] = cols[j]; link[j] = head[r]; head[r] = j; }
        for (int p = cols[j]; p < cols[j + 1]; p++) l[p] = mul(l[p], d[j]);
    }

    /* ---- selected inverse, by dense fronts of supernodes ---- */
    int *first = post, *of = back, *above = order, ns = 0, *loc = seen;
    size_t *at = malloc((n + 1) * sizeof(size_t)), space = 0;
    for (int j = 0; j < n; j++) {
        if (j == 0 || up[j - 1] != j || cols[j] - cols[j - 1] != cols[j + 1] - cols[j] + 1) first[ns++] = j;
        of[j] = ns - 1;
    }
    first[ns] = n;
    for (int s = ns - 1; s >= 0; s--) {
        int u = up[first[s + 1] - 1];
        size_t size = cols[first[s] + 1] - cols[first[s]] + 1;
        above[s] = u < 0 ? -1 : of[u]; at[s] = 0;
        if (u >= 0) { int q = above[s]; size_t ps = cols[first[q] + 1] - cols[first[q]] + 1; at[s] = at[q] + ps * ps; }
        if (at[s] + size * size > space) space = at[s] + size * size;
    }
    cplx *fronts = malloc((space + 1) * sizeof(cplx));
    for (int s = ns - 1; s >= 0; s--) {
        int begin = first[s], end = first[s + 1], own = end - begin, cnt = cols[end] - cols[end - 1], size = own + cnt;
        cplx *front = fronts + at[s];
        if (above[s] >= 0) {
            int q = above[s], pb = first[q], pe = first[q + 1], po = pe - pb, ps = cols[pb + 1] - cols[pb] + 1, t = 0;
            const int *want = rows + cols[end - 1], *bel = rows + cols[pe - 1];
            for (; t < cnt && want[t] < pe; t++) loc[t] = want[t] - pb;
            for (int k = 0; t < cnt; t++) { while (bel[k] != want[t]) k++; loc[t] = po + k++; }
            for (int u = 0; u < cnt; u++) {
                const cplx *from = fronts + at[q] + (size_t)loc[u] * ps;
                cplx *to = front + (size_t)(own + u) * size + own;
                for (int w = u; w < cnt; w++) to[w] = from[loc[w]];
            }
        }
        for (int j = end - 1; j >= begin; j--) {
            int a = j - begin, c = size - a - 1;
            cplx *restrict res = z + cols[j], *restrict x = l + cols[j], *col = front + (size_t)a * size + a, t = d[j];
            const cplx *restrict f = col + size + 1;
            for (int r = 0; r < c; r++) res[r] = (cplx){0, 0};
            for (int r = 0; r < c; r++, f += size + 1) {
                cplx xr = x[r], sum = mul(f[0], xr);
                for (int w = r + 1; w < c; w++) {
                    cplx u = mul(f[w - r], xr), v2 = mul(f[w - r], x[w]);
                    res[w].re += u.re; res[w].im += u.im; sum.re += v2.re; sum.im += v2.im;
                }
                res[r].re += sum.re; res[r].im += sum.im;
            }
            for (int r = 0; r < c; r++) {
                res[r].re = -res[r].re; res[r].im = -res[r].im;
                cplx w = mul(x[r], res[r]);
                t.re -= w.re; t.im -= w.im;
            }
            memcpy(col + 1, res, c * sizeof(cplx));
            col[0] = t; zd[node[j]] = t;
        }
    }
    free(fronts); free(at);
    for (int s = 0; s < m; s++) zo[s] = z[pos[s]];
    int *gone[] = {start, nb, slot, copy, order, place, parent, count, seen, post, back, node, up, cols, next, pos, rows};
    for (int k = 0; k < 17; k++) free(gone[k]);
    free(l); free(d); free(piv); free(y); free(z); free(err);
    return worst ? -lnz : lnz;
}
