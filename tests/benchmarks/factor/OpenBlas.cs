using System.Runtime.InteropServices;

namespace Auditor.Benchmarks.Factor;

/// <summary>
/// dgemm and dgeqrf of an OpenBLAS shared library, one thread. The library's path is given by the caller; the program runs without it. Fortran interface, 32-bit
/// integers.
/// </summary>
internal sealed unsafe class OpenBlas
{
    private readonly delegate* unmanaged<byte*, byte*, int*, int*, int*, double*, double*, int*, double*, int*, double*, double*, int*, void> _dgemm;
    private readonly delegate* unmanaged<int*, int*, double*, int*, double*, double*, int*, int*, void> _dgeqrf;
    private readonly delegate* unmanaged<byte*> _config;

    private OpenBlas(nint library)
    {
        _dgemm = (delegate* unmanaged<byte*, byte*, int*, int*, int*, double*, double*, int*, double*, int*, double*, double*, int*, void>)NativeLibrary.GetExport(library, "dgemm_");
        _dgeqrf = (delegate* unmanaged<int*, int*, double*, int*, double*, double*, int*, int*, void>)NativeLibrary.GetExport(library, "dgeqrf_");
        _config = (delegate* unmanaged<byte*>)NativeLibrary.GetExport(library, "openblas_get_config");
        var threads = (delegate* unmanaged<int, void>)NativeLibrary.GetExport(library, "openblas_set_num_threads");
        threads(1);
    }

    public string Version => Marshal.PtrToStringUTF8((nint)_config()) ?? "";

    public static OpenBlas? Load(string path) => NativeLibrary.TryLoad(path, out var library) ? new OpenBlas(library) : null;

    /// <summary>c += a b, all n x n.</summary>
    public void Multiply(int n, double[] a, double[] b, double[] c)
    {
        var (plain, one) = ((byte)'N', 1.0);
        fixed (double* pa = a, pb = b, pc = c)
        {
            _dgemm(&plain, &plain, &n, &n, &n, &one, pa, &n, pb, &n, &one, pc, &n);
        }
    }

    /// <summary>Factors a, m x n, in place.</summary>
    public void Factor(int m, int n, double[] a)
    {
        var (work, tau, size, info) = (new double[64 * n], new double[n], 64 * n, 0);
        fixed (double* pa = a, pw = work, pt = tau)
        {
            _dgeqrf(&m, &n, pa, &m, pt, pw, &size, &info);
        }
    }
}
